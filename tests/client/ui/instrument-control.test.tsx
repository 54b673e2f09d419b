import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { readTemperatureK, setInstrument, useInstrument } from '#client/lib/instrument.ts';
import { InstrumentControl } from '#client/ui/instrument-control.tsx';

function Header() {
  const { temperatureK, unit, setTemperatureK, setUnit } = useInstrument();
  return <InstrumentControl temperatureK={temperatureK} unit={unit} onTemperatureK={setTemperatureK} onUnit={setUnit} />;
}

const temperature = () => screen.getByRole<HTMLInputElement>('textbox');

describe('instrument', () => {
  it.each([
    ['700', 700], ['650 K', 650], ['298,15', 298.15], ['1', 1], ['5000', 5000],
    ['0', null], ['5001', null], ['-3', null], ['hot', null], ['', null], ['1e3', null], ['Infinity', null],
  ])('reads %s as %s', (text, value) => {
    expect(readTemperatureK(text)).toBe(value);
  });

  it('takes a temperature on Enter and remembers it with the unit', async () => {
    setInstrument({ temperatureK: 700, unit: 'kJ/mol' });
    const user = userEvent.setup();
    render(<Header />);
    await user.clear(temperature());
    await user.type(temperature(), '650{Enter}');
    await user.selectOptions(screen.getByRole('combobox'), 'eV');
    expect(temperature().value).toBe('650');
    expect(window.localStorage.getItem('sillstone.instrument')).toBe('650 eV');
  });

  it('says what is wrong with a temperature, keeps the last good one, and Escape brings it back', async () => {
    setInstrument({ temperatureK: 700, unit: 'kJ/mol' });
    const user = userEvent.setup();
    render(<Header />);
    await user.clear(temperature());
    await user.type(temperature(), '9000{Enter}');
    expect(temperature().getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByRole('alert').textContent).toContain('1 to 5000 K');
    await user.keyboard('{Escape}');
    expect(temperature().value).toBe('700');
    expect(screen.queryByRole('alert')).toBeNull();
  });

  it('steps by the arrows, ten kelvin at a time, a hundred with Shift, and stops at the limits', async () => {
    setInstrument({ temperatureK: 4950, unit: 'kJ/mol' });
    const user = userEvent.setup();
    render(<Header />);
    await user.click(temperature());
    await user.keyboard('{ArrowDown}');
    expect(temperature().value).toBe('4940');
    await user.keyboard('{Shift>}{ArrowUp}{/Shift}');
    expect(temperature().value).toBe('5000');
  });

  it('does not remember what only a link asked for', () => {
    setInstrument({ temperatureK: 700, unit: 'kJ/mol' });
    window.localStorage.clear();
    setInstrument({ temperatureK: 500 }, false);
    render(<Header />);
    expect(temperature().value).toBe('500');
    expect(window.localStorage.getItem('sillstone.instrument')).toBeNull();
  });
});
