import type { Bound } from '#shared/domain/kinds.ts';

/** Invented rows to look at the kit with. */
export interface GalleryRow {
  id: string;
  equation: string;
  stepClass: string;
  surface: string;
  energy: number | null;
  low?: number;
  high?: number;
  bound: Bound;
  u: number | null;
  reactionEnergy?: number;
  printed: string;
  k: number | null;
  extrapolated: boolean;
  method: string;
  computed: boolean;
  scope: 'elementary' | 'apparent';
  range: string;
  source: string;
}

const row = (id: string, equation: string, stepClass: string, surface: string, energy: number | null, u: number | null, printed: string, k: number | null, method: string, range: string, source: string, more: Partial<GalleryRow> = {}): GalleryRow => ({
  id, equation, stepClass, surface, energy, u, printed, k, method, range, source, bound: '=', extrapolated: false, computed: false, scope: 'elementary', ...more,
});

const desorption = 'N* + N* -> N2 + 2*';
const adsorption = 'N2 + 2* -> 2N*';
const dehydrogenation = 'NH3* + * -> NH2* + H*';

export const galleryRows: readonly GalleryRow[] = [
  row('a', desorption, 'associative desorption', 'Ru(0001)', 186.188, 2.93, '44.5 ± 1.4 kcal/mol', 0.128, 'TPD', '430–620', 'Vantongeren 1994', { extrapolated: true, reactionEnergy: 90 }),
  row('b', desorption, 'associative desorption', 'Ru(0001), step edge', 158.236, 3.9, '1.64(4) eV', 34, 'TPD', '400–700', 'Haldane-Roux 2003'),
  row('c', desorption, 'associative desorption', 'Ru/MgO, 2.1 nm', 137, null, '137', null, 'steady state', '623–723', 'Mbeki-Lindqvist 2011', { scope: 'apparent' }),
  row('d', adsorption, 'dissociative adsorption', 'Ru(0001)', 120.6, 8.7, '1.25 ± 0.09 eV', 8.8e-6, 'molecular beam', '500–900', 'Sørlie 1999'),
  row('e', adsorption, 'dissociative adsorption', 'Ru(0001), step edge', 38.6, null, '0.40', 12, 'DFT, revised PBE', '–', 'Achterberg 2001', { computed: true, reactionEnergy: -30 }),
  row('f', adsorption, 'dissociative adsorption', 'Fe(111)', 14.2, 2.9, '3.4 ± 0.7 kcal/mol', 790, 'molecular beam', '300–740', 'Petrescu 1988', { reactionEnergy: 22 }),
  row('g', adsorption, 'dissociative adsorption', 'Co(0001)', null, null, '≥ 36 kcal/mol', null, 'TPD', '320–540', 'Nyberg-Asante 1991', { low: 150.6, bound: '≥' }),
  row('h', dehydrogenation, 'dehydrogenation', 'Ru(0001)', 81, 2.9, '0.84(3)', 6e6, 'DFT, dispersion corrected', '–', 'Wierzbicki 2016', { computed: true, reactionEnergy: 20 }),
  row('i', dehydrogenation, 'dehydrogenation', 'Ni(111)', 97.9, 5, '23.4 ± 1.2 kcal/mol', 4.1e5, 'laser-induced desorption', '360–480', 'Castellano 1985', { extrapolated: true }),
  row('j', dehydrogenation, 'dehydrogenation', 'Ni(111)', null, null, '86-94', null, 'isotherms', '300–420', 'Rahimi 1979', { low: 86, high: 94, bound: 'range' }),
];
