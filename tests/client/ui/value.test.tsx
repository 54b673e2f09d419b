import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { Value, valueText, type ValueProps } from '#client/ui/value.tsx';

const cases: [name: string, props: ValueProps, text: string][] = [
  ['two digits of the uncertainty (JCGM 100:2008, 7.2.6)', { value: 186.188, u: 2.93, unit: 'kJ/mol' }, '186.2 ± 2.9 kJ/mol'],
  ['one digit in dense tables', { value: 186.188, u: 2.93, uDigits: 1, unit: 'kJ/mol' }, '186 ± 3 kJ/mol'],
  ['an uncertainty that rounds up a place', { value: 50.04, u: 0.996, unit: 'kJ/mol' }, '50.0 ± 1.0 kJ/mol'],
  ['printed digits and a guard digit', { value: 38.594, significantDigits: 2, unit: 'kJ/mol' }, '38.6 kJ/mol'],
  ['a negative value with a true minus', { value: -3.5, significantDigits: 2 }, '\u22123.50'],
  ['a zero without sign', { value: -0.00001, u: 0.01, unit: 'kJ/mol', scientific: false }, '0.000 ± 0.010 kJ/mol'],
  ['a bound', { value: null, low: 150.6, bound: '≥', significantDigits: 2, unit: 'kJ/mol' }, '≥ 151 kJ/mol'],
  ['a range', { value: null, low: 24, high: 27, bound: 'range', digits: 2, unit: 'kcal/mol' }, '24 to 27 kcal/mol'],
  ['an approximate value', { value: 25, bound: '≈', digits: 2, unit: 'kJ/mol' }, '≈ 25 kJ/mol'],
  ['a power of ten', { value: 0.000088, digits: 2, unit: 's-1' }, '8.8 × 10^\u22125 s-1'],
  ['a power of ten with its uncertainty on the same power', { value: 1.1e13, u: 2e12, unit: 's-1' }, '(1.10 ± 0.20) × 10^13 s-1'],
  ['an uncertainty of the logarithm as a factor', { value: 1e13, u: 0.92, uScale: 'ln', digits: 1, unit: 's-1' }, '1 × 10^13 ×/÷ 2.5 s-1'],
  ['nothing', { value: null }, 'not reported'],
];

describe('value', () => {
  it.each(cases)('%s', (_, props, text) => {
    expect(valueText(props)).toBe(text);
  });

  it.each(cases)('is set and copied as its text says: %s', (_, props, text) => {
    const { container } = render(<Value {...props} />);
    const copied = (container.textContent ?? '').replace(/[\s\u2009]+/g, ' ').replace(/(?<=s)\u2212(?=1)/, '-');
    expect(copied).toBe(text);
  });

  it('sets exponents of numbers and units as superscripts', () => {
    const { container } = render(<Value value={3.4e-8} digits={2} unit="cm2 molecule-1 s-1" />);
    expect([...container.querySelectorAll('sup')].map((sup) => sup.textContent)).toEqual(['\u22128', '2', '\u22121', '\u22121']);
  });
});
