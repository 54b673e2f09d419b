import type { FitPlotPoint } from '#client/ui/fit-plot.tsx';
import type { IntervalRow } from '#client/ui/interval-rows.ts';
import type { ProfilePathway } from '#client/ui/profile-layout.ts';

/** Invented values for the gallery's plots. */
export const fitPoints: FitPlotPoint[] = [
  [450, -5.41, 0.12], [480, -3.22, 0.1], [510, -1.18, 0.08], [540, 0.51, 0.08], [570, 2.1, 0.07], [600, 3.42, 0.1], [630, 4.78, 0.12], [660, 4.9, 0.3],
].map(([temperatureK = 0, lnK = 0, uLnK = 0]) => ({ temperatureK, lnK, uLnK }));

export const intervalRows: IntervalRow[] = [
  { id: 'a', label: 'Vantongeren & Osei-Brandt 1994', value: 186.2, u: 2.9, group: 'Terrace', weight: 0.22, href: '/entries/K7Q-4MD-2' },
  { id: 'b', label: 'Petrescu 1988', value: 158, u: 12, group: 'Terrace', weight: 0.12 },
  { id: 'c', label: 'Haldane-Roux, Brisebois & Adeyemi-Holt 2003', value: 149, u: 5, group: 'Terrace', weight: 0.2, computed: true },
  { id: 'd', label: 'Okonjo-Vale 2016', value: 141, u: 3.4, group: 'Terrace', weight: 0.21 },
  { id: 'e', label: 'Brisebois 2011', value: null, u: null, low: 121, high: 152, bound: 'range', group: 'Terrace' },
  { id: 'f', label: 'Adeyemi-Holt 2020', value: 92, u: null, group: 'Step edge', computed: true },
  { id: 'g', label: 'Lindqvist-Mora 1979', value: 152, u: null, bound: '≥', group: 'Step edge' },
  { id: 'h', label: 'Tanaka-Weiss 2001', value: 70, u: null, bound: '<', group: 'Step edge' },
];

export const leftOneOut: IntervalRow[] = [
  { id: 'a', label: 'without Vantongeren 1994', value: 146.1, u: null, low: 138.2, high: 154 },
  { id: 'b', label: 'without Petrescu 1988', value: 153.6, u: null, low: 139, high: 168.2 },
  { id: 'c', label: 'without Haldane-Roux 2003', value: 156.3, u: null, low: 140.4, high: 172.2 },
  { id: 'd', label: 'without Okonjo-Vale 2016', value: 159.9, u: null, low: 146.8, high: 173 },
];

const steps = ['NH3(g) + 3*', 'NH3* + 2*', 'TS N–H', 'NH2* + H*', 'TS N–H', 'NH* + 2H*', 'TS N–H', 'N* + 3H*', 'TS N–N', '½N2(g)'];
const kinds = ['state', 'state', 'transition', 'state', 'transition', 'state', 'transition', 'state', 'transition', 'state'] as const;
const pathway = (id: string, label: string, energies: readonly number[], u: number | null): ProfilePathway => ({
  id, label, states: energies.map((energy, index) => ({ energy, label: steps[index] ?? '', kind: kinds[index] ?? 'state', u: index % 3 === 2 ? u : null })),
});

export const pathways: ProfilePathway[] = [
  pathway('ru', 'Ru(0001), terrace', [0, -71, 42, -20, 60, -34, 75, -52, 118, 46], 9),
  pathway('ni', 'Ni(111), terrace', [0, -60, 61, 8, 84, -6, 101, 12, 141, 46], 11),
];

export const longPathway: ProfilePathway = {
  id: 'long', label: 'hydrogen-assisted, over the step edge',
  states: [
    { label: 'gas and clean surface', energy: 0, kind: 'state' }, { label: 'molecular ammonia on the atop site', energy: -0.9, kind: 'state' },
    { label: 'first scission over the step edge', energy: 0.3, kind: 'transition', u: 0.1 }, { label: 'amide in the bridge site', energy: -0.4, kind: 'state' },
    { label: 'second scission', energy: 0.5, kind: 'transition' }, { label: 'imide and two hydrogen atoms', energy: -0.5, kind: 'state' },
  ],
};
