import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readStep, StepError } from '#shared/steps/parse-step.ts';
import { speakStep, stepTokens } from '#shared/steps/step-format.ts';

interface Part {
  coefficient: number;
  name: string;
  star: boolean;
}

/** Pairs of atoms and molecules that can be put together into a balanced step. */
const splits = [
  ['N2', 'N', 'N'], ['H2', 'H', 'H'], ['CO', 'C', 'O'], ['NH3', 'NH2', 'H'], ['NH2', 'NH', 'H'], ['CHO', 'CO', 'H'], ['CH4', 'CH3', 'H'], ['OH', 'O', 'H'], ['C2H6', 'CH3', 'CH3'], ['ND3', 'ND2', 'D'],
] as const;

const step = fc.record({ split: fc.constantFrom(...splits), times: fc.integer({ min: 1, max: 3 }), gas: fc.boolean(), spectator: fc.boolean() }).map(({ split: [whole, a, b], times, gas, spectator }) => {
  const left: Part[] = [{ coefficient: times, name: whole, star: !gas }, { coefficient: gas ? 2 * times : times, name: '', star: true }];
  const right: Part[] = [{ coefficient: times, name: a, star: true }, { coefficient: times, name: b, star: true }];
  if (spectator) for (const side of [left, right]) side.push({ coefficient: 1, name: 'Cl', star: true });
  return { left, right };
});

type Style = (part: Part) => string;
const count = (coefficient: number, mark = ''): string => (coefficient === 1 ? '' : `${coefficient}${mark}`);
const marked = (mark: string, free: string, gas: string): Style => ({ coefficient, name, star }) => `${count(coefficient, ' ')}${name === '' ? free : `${name}${star ? mark : gas}`}`;
const styles: Style[] = [
  ({ coefficient, name, star }) => `${count(coefficient)}${name}${star ? '*' : ''}`,
  ({ coefficient, name, star }) => `${count(coefficient, ' ')}${star && name ? '*' : ''}${name}${star && !name ? '*' : ''}`,
  ({ coefficient, name, star }) => `${coefficient} ${name || '*'}${star && name ? '(ads)' : ''}${star ? '' : '(g)'}`,
  ({ coefficient, name, star }) => Array.from({ length: coefficient }, () => `${name}${star ? '∗' : ''}`).join(' + '),
  ({ coefficient, name, star }) => `${count(coefficient, '×')}${name.replace(/\d/g, (digit) => '₀₁₂₃₄₅₆₇₈₉'[Number(digit)] as string)}${star ? '*' : ''}`,
  ({ coefficient, name, star }) => `${count(coefficient)}\\mathrm{${name.replace(/(\d)/g, '_{$1}') || '{}'}}${star ? '^{\\ast}' : ''}`,
  ({ coefficient, name, star }) => `${count(coefficient)}${name.replace(/(\d)/g, '<sub>$1</sub>')}${star ? '<sup>*</sup>' : ''}`,
  marked('_ads', '*', '_g'), marked('ads', '*', 'g'), marked('(a)', '□', ' (g)'), marked('(S)', 'RH(S)', ''), marked('·θ', 'θ', '(g)'), marked('-M', 'M', '(g)'), marked('X', 'X', ''),
];
const arrows = ['->', '→', '⇌', '<->', '=', '=>', '-->', '<=>', '\\rightarrow ', '&rarr;'];

const write = (left: Part[], right: Part[], style: Style, arrow: string): string => `${left.map(style).join(' + ')} ${arrow} ${right.map(style).join(' + ')}`;

describe('elementary steps', () => {
  it('has one key in every style, order and direction', () => {
    fc.assert(
      fc.property(step, fc.constantFrom(...styles), fc.constantFrom(...arrows), fc.boolean(), fc.boolean(), ({ left, right }, style, arrow, swap, turn) => {
        const plain = readStep(write(left, right, styles[0] as Style, '->'));
        const [l, r] = [swap ? [...left].reverse() : left, swap ? [...right].reverse() : right];
        const other = readStep(turn ? write(r, l, style, arrow) : write(l, r, style, arrow));
        expect(other.key).toBe(plain.key);
        expect(other.variantKey).toBe(plain.variantKey);
        expect(other.direction).toBe(turn ? -plain.direction : plain.direction);
        if (!turn) expect([other.class, other.gasOrder, other.surfaceOrder]).toEqual([plain.class, plain.gasOrder, plain.surfaceOrder]);
      }),
    );
  });

  it('reads what it prints', () => {
    fc.assert(
      fc.property(step, fc.constantFrom(...styles), ({ left, right }, style) => {
        const first = readStep(write(left, right, style, '->'));
        expect(readStep(first.equation)).toEqual(first);
        expect(readStep(first.key).key).toBe(first.key);
      }),
    );
  });

  it('throws nothing but its own error, on any text', () => {
    const piece = fc.constantFrom('N', 'H', 'CO', 'NH3', '*', '**', '2', '1/2', '½', ' + ', '+', ' -> ', '=', '<-', '⇌', '(g)', '(ads)', '_fcc', '_', '^', '{', '}', '[13C]', '[', ']', '(', ')', 'D', 'e-', '-', ' ', '²', '⁺', '\\to', '$', 'x', '\\ce{', '\\mathrm{', 'η2-', '(S)', '(s)', 'M', 'X', 'S', '-', '13', '15N', '^2-', '<sub>', '</sub>', '@', '·', 'Co', 'a', 'ads', 'T', 'θ', '*2', '*1', 'Pt', '[ ]', '(1) ', 'R2: ', '--', 'C18O', ',', '&rarr;');
    fc.assert(
      fc.property(fc.oneof(fc.string({ maxLength: 80 }), fc.array(piece, { maxLength: 20 }).map((pieces) => pieces.join(''))), (text) => {
        try {
          const first = readStep(text);
          const again = readStep(first.equation);
          expect(again.key).toBe(first.key);
          expect(again.equation).toBe(first.equation);
          expect(stepTokens(first).length).toBeGreaterThan(2);
          expect(speakStep(first)).toContain(' to ');
        } catch (error) {
          if (!(error instanceof StepError)) throw error;
          if (error.position !== undefined) {
            expect(error.position).toBeGreaterThanOrEqual(0);
            expect(error.position).toBeLessThanOrEqual(text.length);
          }
          if (error.suggestion !== undefined) expect(() => readStep(error.suggestion as string)).not.toThrow();
          if (error.code === 'ambiguous' && error.readings) expect(error.readings.length).toBeGreaterThan(1);
        }
      }),
      { numRuns: 4000 },
    );
  });

  it('turns its sign with the direction, and keeps its key with isotopes and kinds of site', () => {
    const labels = fc.constantFrom<[string, string]>(['H', 'D'], ['N', '[15N]'], ['C', '^{13}C'], ['O', '¹⁸O'], ['*', '*_fcc'], ['*', '*{step}'], ['*', '*@B5']);
    fc.assert(
      fc.property(step, labels, ({ left, right }, [from, to]) => {
        const [there, back] = [write(left, right, styles[0] as Style, '->'), write(right, left, styles[0] as Style, '->')];
        const label = (text: string) => text.replaceAll(new RegExp(from === '*' ? '\\*' : `${from}(?![a-z])`, 'g'), to);
        const [plain, labelled, turned] = [readStep(there), readStep(label(there)), readStep(label(back))];
        expect([labelled.key, turned.key]).toEqual([plain.key, plain.key]);
        expect(labelled.variantKey).toBe(turned.variantKey);
        expect(labelled.direction).toBe(-turned.direction);
        expect(readStep(labelled.variantKey).variantKey).toBe(labelled.variantKey);
      }),
    );
  });

  it.each(['** <-> *', 'CO -> CO + *'])('suggests no step in which nothing happens: %s', (text) => {
    expect(() => readStep(text)).toThrow(StepError);
    try {
      readStep(text);
    } catch (error) {
      expect((error as StepError).suggestion).toBeUndefined();
    }
  });

  it('does not hang on hostile text', () => {
    const start = performance.now();
    for (const text of ['('.repeat(400), '*'.repeat(400), '+'.repeat(400), '='.repeat(400), '<-'.repeat(200), '_{'.repeat(200), `${'C'.repeat(380)}->C`, `${'1'.repeat(380)}->C`, 'H9999*'.repeat(60), '\\ce{'.repeat(80), '<sub>'.repeat(80), '->[k]'.repeat(80), `${'O2- + '.repeat(20)}O2- -> O2*`, ' '.repeat(400), `N2 ${' '.repeat(380)}-> N2`, '(1) '.repeat(100), `${'*-'.repeat(190)}C -> C`, 'η2-'.repeat(130), `${'[('.repeat(190)}->`, '_{(ads'.repeat(60), '&rarr;'.repeat(60), `${'H·S + '.repeat(20)}S -> S`, `C${'18'.repeat(190)}O -> C`, `${'(C)9'.repeat(90)} -> C`]) {
      try {
        readStep(text);
      } catch (error) {
        expect(error).toBeInstanceOf(StepError);
      }
    }
    expect(performance.now() - start).toBeLessThan(1000);
  });
});
