import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { placePoints, type StripPoint } from '#client/ui/strip-layout.ts';
import { Strip, type StripRange } from '#client/ui/strip.tsx';

const point = (id: string, value: number, more: Partial<StripPoint> = {}): StripPoint => ({ id, value, bound: '=', computed: false, label: `${id}, ${value} kJ/mol`, ...more });
const points = [point('a', 186), point('b', 14, { computed: true }), point('c', 150, { bound: '≥' })];

function Page({ onRange = () => undefined, onOpen }: { onRange?: (range: StripRange) => void; onOpen?: (id: string) => void }) {
  const [active, setActive] = useState<string | null>(null);
  return <Strip points={points} unit="kJ/mol" what="Activation energy" activeId={active} onActive={setActive} onRange={onRange} onOpen={onOpen} />;
}

describe('strip', () => {
  it('names each value, in the order of the axis, and is moved through by the arrows', async () => {
    const user = userEvent.setup();
    const onOpen = vi.fn();
    render(<Page onOpen={onOpen} />);
    expect(screen.getAllByRole('option').map((option) => option.getAttribute('aria-label'))).toEqual(['b, 14 kJ/mol', 'c, 150 kJ/mol', 'a, 186 kJ/mol']);
    screen.getByRole('listbox', { name: 'Activation energy of 3 entries, by value' }).focus();
    await user.keyboard('{ArrowRight}{ArrowRight}');
    expect(screen.getByRole('option', { selected: true }).getAttribute('aria-label')).toBe('c, 150 kJ/mol');
    await user.keyboard('{Enter}');
    expect(onOpen).toHaveBeenCalledWith('c');
  });

  it('marks the dot that is pointed at', async () => {
    const user = userEvent.setup();
    render(<Page />);
    await user.hover(screen.getByRole('option', { name: /^a/ }));
    expect(screen.getByRole('option', { selected: true }).getAttribute('aria-label')).toBe('a, 186 kJ/mol');
  });

  it.each([
    ['100', '160', { min: 100, max: 160 }],
    ['', '160', { min: null, max: 160 }],
    ['\u22125', '', { min: -5, max: null }],
  ])('takes a typed range from %s to %s', async (from, to, range) => {
    const user = userEvent.setup();
    const onRange = vi.fn();
    render(<Page onRange={onRange} />);
    if (from) await user.type(screen.getByLabelText('from'), from);
    if (to) await user.type(screen.getByLabelText('to'), to);
    await user.keyboard('{Enter}');
    expect(onRange).toHaveBeenLastCalledWith(range);
  });

  it.each([['warm', ''], ['10', '5']])('refuses the range from %s to %s and says why', async (from, to) => {
    const user = userEvent.setup();
    const onRange = vi.fn();
    render(<Page onRange={onRange} />);
    if (to) await user.type(screen.getByLabelText('to'), to);
    await user.type(screen.getByLabelText('from'), `${from}{Enter}`);
    expect(screen.getByRole('alert').textContent).toBeTruthy();
    expect(onRange).not.toHaveBeenCalledWith({ min: 10, max: 5 });
  });

  it('becomes a histogram above 400 values', () => {
    const many = Array.from({ length: 401 }, (_, index) => point(String(index), index / 2));
    const { container } = render(<Strip points={many} unit="kJ/mol" what="Activation energy" />);
    expect(screen.queryAllByRole('option')).toHaveLength(0);
    expect(screen.getByRole('img', { name: 'Activation energy of 401 entries as a histogram, in kJ/mol' })).toBeTruthy();
    expect(container.querySelectorAll('.strip-bar').length).toBeGreaterThan(10);
  });

  it('puts no dot over another while there is a free lane', () => {
    const placed = placePoints([0, 2, 4, 6, 100].map((value) => point(String(value), value)), (value) => value);
    expect(placed.map((one) => one.lane)).toEqual([0, 1, 2, 3, 0]);
  });
});
