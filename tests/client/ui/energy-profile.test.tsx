import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { EnergyProfile } from '#client/ui/energy-profile.tsx';
import { textWidth } from '#client/ui/fitted-label.ts';
import { highestOf, labelBands, placeLabels, stairs, type ProfilePathway } from '#client/ui/profile-layout.ts';
import { onOneAxis } from './affine.ts';

const energies = [0, -71, 42, -20, 60];
const pathway = (id: string, of: number[] = energies, more: Partial<ProfilePathway> = {}): ProfilePathway => ({
  id, label: `Pathway ${id}`, ...more, states: of.map((energy, index) => ({ label: `state ${index}`, energy, kind: index % 2 === 0 && index > 0 ? 'transition' : 'state', u: index === 2 ? 9 : null })),
});
const draw = (pathways: ProfilePathway[], more: Partial<Parameters<typeof EnergyProfile>[0]> = {}) => render(<EnergyProfile pathways={pathways} unit="kJ/mol" what="Enthalpy" {...more} />).container;

describe('the energy profile', () => {
  it('is flat along each state at its energy, and upright between', () => {
    const d = draw([pathway('a')]).querySelector('.profile-stairs')?.getAttribute('d') ?? '';
    const levels = [...d.matchAll(/(?:M[\d.]+ |V)(-?[\d.]+)/g)].map(([, level]) => Number(level));
    expect(onOneAxis(energies, levels)).toBe(true);
  });

  it('raises transition states by a strong top and a state not', () => {
    expect(draw([pathway('a')]).querySelectorAll('.profile-top')).toHaveLength(2);
  });

  it.each<[string, Partial<ProfilePathway>, number | undefined, string[]]>([
    ['found', {}, undefined, ['60']], ['given for the first', {}, 2, ['42']], ['given with the pathway', { highest: 1 }, undefined, ['\u221271']],
  ])('marks the highest point: %s', (_, more, highest, figures) => {
    const container = draw([pathway('a', energies, more)], { highest });
    expect([...container.querySelectorAll('.profile-highest text')].map((text) => text.textContent)).toEqual(figures);
  });

  it('has a whisker only where there is an uncertainty', () => {
    expect(draw([pathway('a')]).querySelectorAll('.profile-whisker')).toHaveLength(1);
  });

  it('sets several pathways apart by mark and name', () => {
    const container = draw([pathway('a'), pathway('b', [0, 10, 120, 5])]);
    expect(container.querySelectorAll('.profile-stairs')).toHaveLength(2);
    expect(container.querySelectorAll('.profile-highest')).toHaveLength(2);
    expect(screen.getByText('Pathway b', { selector: '.plot-legend-label' })).toBeTruthy();
  });

  it('reads each state aloud as the arrows move through them', async () => {
    const user = userEvent.setup();
    draw([pathway('a'), pathway('b', [0, 10])]);
    screen.getByRole('listbox', { name: 'Enthalpy of 2 pathways, state by state, in kJ/mol; the figures are in the table below' }).focus();
    const said = () => screen.getByRole('option', { selected: true }).getAttribute('aria-label');
    await user.keyboard('{ArrowRight}{ArrowRight}{ArrowRight}');
    expect(said()).toBe('Pathway a: state 2, transition state, 42 ± 9 kJ/mol');
    await user.keyboard('{End}');
    expect(said()).toBe('Pathway b: state 1, 10 kJ/mol, highest');
    await user.keyboard('{Escape}');
    expect(screen.queryByRole('option', { selected: true })).toBeNull();
  });

  it('has the figures behind it as a table', async () => {
    draw([pathway('a')]);
    await userEvent.setup().click(screen.getByText('The plot as a table'));
    expect(screen.getAllByRole('row').map((row) => row.textContent)).toContain('state 2transition state429');
  });

  it('says when there is nothing to draw', () => {
    draw([pathway('a', [])]);
    expect(screen.getByText('No state to draw yet.')).toBeTruthy();
  });
});

describe('the names under a profile', () => {
  const room = { slot: 60, middle: (index: number) => 60 + index * 60, width: 700 };

  it.each<[string, string[], number[]]>([
    ['side by side where short', ['N*', 'NH*', 'H*'], [0, 0, 0]],
    ['in turns on two rows', ['NH3(g) + 3*', 'NH3* + 2*', 'TS'], [0, 1, 0]],
    ['in turns on three', ['amide beside the edge', 'imide beside the edge', 'nitrogen and hydrogen', 'x'], [0, 1, 2, 0]],
  ])('stand %s', (_, names, levels) => {
    const labels = placeLabels(names, { ...room, middle: (index) => 130 + index * 60 });
    expect(labels.map((label) => label.level)).toEqual(levels);
    expect(labels.map((label) => label.text)).toEqual(names);
  });

  it('never touch each other or leave the drawing, whatever their length', () => {
    fc.assert(fc.property(fc.array(fc.string({ maxLength: 60 }), { minLength: 1, maxLength: 12 }), fc.integer({ min: 46, max: 200 }), (names, slot) => {
      const width = 66 + names.length * slot;
      const labels = placeLabels(names, { slot, middle: (index) => 52 + slot * (index + 0.5), width });
      for (const [index, label] of labels.entries()) {
        const half = textWidth(label.text) / 2;
        expect(label.x - half).toBeGreaterThanOrEqual(-1);
        expect(label.x + half).toBeLessThanOrEqual(width + 1);
        const next = labels.slice(index + 1).find((one) => one.level === label.level);
        if (next) expect(next.x - textWidth(next.text) / 2).toBeGreaterThan(label.x + half);
        expect(label.full).toBe(names[index]);
      }
    }));
  });

  it('are written once for pathways that share them', () => {
    const bands = labelBands([pathway('a'), pathway('b'), pathway('c', [0, 1])], room);
    expect(bands.map((band) => band.pathwayIds)).toEqual([['a', 'b'], ['c']]);
  });
});

describe('stairs', () => {
  it('go flat, then upright', () => {
    expect(stairs(pathway('a', [0, 5]).states, (index) => index * 10, (energy) => 100 - energy)).toBe('M0 100H10V95H20');
  });

  it('have their highest point at the first of equals', () => {
    expect(highestOf(pathway('a', [0, 7, 3, 7]).states)).toBe(1);
  });
});
