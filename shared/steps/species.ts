/** Where a species is. */
export type Phase = 'gas' | 'adsorbed' | 'free-site';

/** A gas molecule, an adsorbed species or a free site. */
export interface Species {
  /** Formula without isotopes, in one spelling; `*` for a free site. */
  formula: string;
  /** Formula with its isotopes, as it is printed. */
  spelling: string;
  /** Atoms by element, isotopes counted as their element. */
  composition: Record<string, number>;
  phase: Phase;
  /** Sites that it occupies; 1 for a free site, 0 for a gas. */
  sites: number;
  /** Named kind of site: fcc, B5, edge. */
  siteType?: string;
  /** Labelled atoms by isotope: `2H`, `3H`, `13C`. */
  isotopes?: Record<string, number>;
  /** Charge number. */
  charge?: number;
}

/** A species with its stoichiometric coefficient, above 0. */
export interface Term {
  coefficient: number;
  species: Species;
}
