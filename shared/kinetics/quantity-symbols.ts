/** Every quantity that an entry can hold: a closed list. */
export const quantitySymbols = [
  'energy',
  'preExponential',
  'exponent',
  'referenceTemperature',
  'rateConstant',
  'kie',
  'stickingCoefficient',
  'activationEntropy',
  'reactionEnergy',
  'adsorptionEnergy',
  'equilibriumConstant',
  'turnoverRate',
  'reactionOrder',
  'diffusionCoefficient',
  'coverageSlope',
] as const;

/** One of `quantitySymbols`. */
export type QuantitySymbol = (typeof quantitySymbols)[number];

/** What an energy is: different types are different quantities. */
export const energyTypes = ['arrhenius', 'electronic', 'zero-point-corrected', 'enthalpy', 'gibbs'] as const;

/** One of `energyTypes`. */
export type EnergyType = (typeof energyTypes)[number];

/** What a coverage is counted against. */
export const coverageDefinitions = ['per-surface-atom', 'per-adsorption-site', 'relative-to-saturation'] as const;

/** One of `coverageDefinitions`. */
export type CoverageDefinition = (typeof coverageDefinitions)[number];

/** What the printed rate counts: events of the elementary step, consumption of a named species with its coefficient, or not stated. */
export type RateOf = 'event' | 'unknown' | { consumption: string; coefficient: number };

/** What a conversion may draw on; what is absent is reported as missing, never assumed. */
export interface QuantityContext {
  /** Gas molecules on the reactant side of the elementary step. */
  gasOrder?: number | null;
  /** Adsorbed species and free sites on the reactant side. */
  surfaceOrder?: number | null;
  /** Orders that the source reports, by species; they replace the stoichiometry. A species with `*` or (ads) counts for the surface. */
  kineticOrders?: Readonly<Record<string, number>> | null;
  rateOf?: RateOf | null;
  /** Temperature at which a single rate constant holds [K]. */
  temperatureK?: number | null;
  /** T0 of a modified Arrhenius form [K]; 1 K when none is stated. */
  referenceTemperatureK?: number | null;
  /** Site density [m-2]. */
  siteDensityPerM2?: number | null;
  /** Where the site density comes from, in words. */
  siteDensitySource?: string | null;
  /** Sites per mass of catalyst [kg-1]. */
  sitesPerKg?: number | null;
  coverageDefinition?: CoverageDefinition | null;
  /** Coverage at saturation, per site. */
  saturationCoverage?: number | null;
  /** True for a constant of kinetic Monte Carlo, printed per pair of neighbours. */
  perPair?: boolean | null;
  /** Nearest neighbours of a site, which mean field needs. */
  nearestNeighbours?: number | null;
  /** True where the two neighbours are of one kind, false where they differ. */
  likePair?: boolean | null;
}
