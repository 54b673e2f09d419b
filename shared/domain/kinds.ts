/** The kinds of entry; an entry's own kind is its primary quantity (energy before k before A). */
export const kinds = [
  'activation-energy', 'barrier', 'rate-constant', 'pre-exponential', 'kie', 'sticking', 'reaction-energy', 'adsorption-energy',
  'equilibrium-constant', 'turnover-rate', 'reaction-order', 'diffusion',
] as const;
export type Kind = (typeof kinds)[number];

/** The kinds in the plural, as the query sentence says them. */
export const kindWords: Readonly<Record<Kind, string>> = {
  'activation-energy': 'activation energies',
  'barrier': 'computed barriers',
  'rate-constant': 'rate constants',
  'pre-exponential': 'pre-exponential factors',
  'kie': 'kinetic isotope effects',
  'sticking': 'sticking coefficients',
  'reaction-energy': 'reaction energies',
  'adsorption-energy': 'adsorption energies',
  'equilibrium-constant': 'equilibrium constants',
  'turnover-rate': 'turnover rates',
  'reaction-order': 'reaction orders',
  'diffusion': 'diffusion coefficients',
};

/** One entry kind in the singular, for headings and forms. */
export const kindWord: Readonly<Record<Kind, string>> = {
  'activation-energy': 'activation energy',
  'barrier': 'computed barrier',
  'rate-constant': 'rate constant',
  'pre-exponential': 'pre-exponential factor',
  'kie': 'kinetic isotope effect',
  'sticking': 'sticking coefficient',
  'reaction-energy': 'reaction energy',
  'adsorption-energy': 'adsorption energy',
  'equilibrium-constant': 'equilibrium constant',
  'turnover-rate': 'turnover rate',
  'reaction-order': 'reaction order',
  'diffusion': 'diffusion coefficient',
};

/** The symbols a quantity may have: the closed list of what an entry can hold. */
export const quantitySymbols = [
  'energy', 'preExponential', 'exponent', 'referenceTemperature', 'rateConstant', 'kie', 'stickingCoefficient', 'activationEntropy',
  'reactionEnergy', 'adsorptionEnergy', 'equilibriumConstant', 'turnoverRate', 'reactionOrder', 'diffusionCoefficient', 'coverageSlope',
] as const;
export type QuantitySymbol = (typeof quantitySymbols)[number];

/** The symbols in words. */
export const symbolWords: Readonly<Record<QuantitySymbol, string>> = {
  energy: 'activation energy',
  preExponential: 'pre-exponential factor',
  exponent: 'temperature exponent',
  referenceTemperature: 'reference temperature',
  rateConstant: 'rate constant',
  kie: 'kinetic isotope effect',
  stickingCoefficient: 'sticking coefficient',
  activationEntropy: 'activation entropy',
  reactionEnergy: 'reaction energy',
  adsorptionEnergy: 'adsorption energy',
  equilibriumConstant: 'equilibrium constant',
  turnoverRate: 'turnover rate',
  reactionOrder: 'reaction order',
  diffusionCoefficient: 'diffusion coefficient',
  coverageSlope: 'coverage dependence of the energy',
};

/** Which quantity an entry of a kind must hold. */
export const primarySymbol: Readonly<Record<Kind, QuantitySymbol>> = {
  'activation-energy': 'energy',
  'barrier': 'energy',
  'rate-constant': 'rateConstant',
  'pre-exponential': 'preExponential',
  'kie': 'kie',
  'sticking': 'stickingCoefficient',
  'reaction-energy': 'reactionEnergy',
  'adsorption-energy': 'adsorptionEnergy',
  'equilibrium-constant': 'equilibriumConstant',
  'turnover-rate': 'turnoverRate',
  'reaction-order': 'reactionOrder',
  'diffusion': 'diffusionCoefficient',
};

/**
 * The kinds a set of quantities answers to, so that a filter by kind matches any quantity held.
 * An energy of type `arrhenius` is an activation energy; of any other type a computed barrier.
 */
export function kindsHeld(quantities: readonly { symbol: QuantitySymbol; energyType?: EnergyType | null }[]): Kind[] {
  const held = new Set<Kind>();
  for (const { symbol, energyType } of quantities) {
    if (symbol === 'energy') held.add(energyType && energyType !== 'arrhenius' ? 'barrier' : 'activation-energy');
    else for (const kind of kinds) if (kind !== 'barrier' && primarySymbol[kind] === symbol) held.add(kind);
  }
  return kinds.filter((kind) => held.has(kind));
}

/** What an energy is: different types are different quantities and are never mixed. */
export const energyTypes = ['arrhenius', 'electronic', 'zero-point-corrected', 'enthalpy', 'gibbs'] as const;
export type EnergyType = (typeof energyTypes)[number];
export const energyTypeWords: Readonly<Record<EnergyType, string>> = {
  'arrhenius': 'Arrhenius activation energy',
  'electronic': 'electronic energy barrier',
  'zero-point-corrected': 'zero-point-corrected barrier',
  'enthalpy': 'enthalpy of activation',
  'gibbs': 'Gibbs energy of activation',
};

/** How the source came by the value. */
export const provenances = [
  'measured', 'derived-from-measured', 'fitted-in-kinetic-model', 'computed', 'computed-then-adjusted', 'estimated', 'assumed', 'quoted',
] as const;
export type Provenance = (typeof provenances)[number];
export const provenanceWords: Readonly<Record<Provenance, string>> = {
  'measured': 'measured',
  'derived-from-measured': 'derived from measured',
  'fitted-in-kinetic-model': 'fitted in a kinetic model',
  'computed': 'computed',
  'computed-then-adjusted': 'computed, then adjusted',
  'estimated': 'estimated from a linear relation',
  'assumed': 'assumed',
  'quoted': 'quoted from elsewhere',
};

/** What the value stands for: one elementary step, several printed as one, or the overall reaction. */
export const scopes = ['elementary', 'lumped', 'apparent'] as const;
export type Scope = (typeof scopes)[number];

export const methodClasses = ['measured', 'computed'] as const;
export type MethodClass = (typeof methodClasses)[number];

/** How the printed value bounds the quantity. */
export const bounds = ['=', '≈', '<', '≤', '>', '≥', 'range'] as const;
export type Bound = (typeof bounds)[number];

/** Kinds of reported uncertainty; a bare ± is `unknown` until somebody says what it is, and never counts as zero. */
export const uncertaintyKinds = [
  'none', 'unknown', 'standard', 'expanded', 'confidence', 'rectangular', 'triangular', 'fit-standard-error', 'spread',
] as const;
export type UncertaintyKind = (typeof uncertaintyKinds)[number];
export const uncertaintyKindWords: Readonly<Record<UncertaintyKind, string>> = {
  'none': 'not reported',
  'unknown': 'reported, kind unknown',
  'standard': 'standard uncertainty',
  'expanded': 'expanded uncertainty',
  'confidence': 'confidence interval',
  'rectangular': 'rectangular half-width',
  'triangular': 'triangular half-width',
  'fit-standard-error': 'standard error of a fit',
  'spread': 'spread of several determinations',
};

/** The form in which the material was studied. */
export const sampleTypes = ['single-crystal', 'foil', 'film', 'supported-particles', 'powder', 'slab-model', 'cluster-model'] as const;
export type SampleType = (typeof sampleTypes)[number];
export const sampleTypeWords: Readonly<Record<SampleType, string>> = {
  'single-crystal': 'single crystal',
  'foil': 'foil',
  'film': 'film',
  'supported-particles': 'supported particles',
  'powder': 'powder',
  'slab-model': 'slab model',
  'cluster-model': 'cluster model',
};

export const structures = ['fcc', 'bcc', 'hcp', 'other'] as const;
export type Structure = (typeof structures)[number];

/** The named site types and step features of a surface. */
export const siteTypes = [
  'terrace', 'step-edge', 'kink', 'defect', 'B5', 'fcc-hollow', 'hcp-hollow', 'bridge', 'top', 'threefold-hollow', 'fourfold-hollow', 'long-bridge', 'short-bridge',
  'edge', 'corner', 'interface', 'subsurface',
] as const;
export type SiteType = (typeof siteTypes)[number];

/** Where the second metal of a near-surface or single-atom alloy is: on, under or in the first layer of its host, or around a core. */
export const arrangements = ['overlayer', 'subsurface', 'single-atom', 'surface-alloy', 'core-shell'] as const;
export type Arrangement = (typeof arrangements)[number];

/** The arrangements in words. */
export const arrangementWords: Readonly<Record<Arrangement, string>> = {
  'overlayer': 'overlayer',
  'subsurface': 'subsurface layer',
  'single-atom': 'single atoms',
  'surface-alloy': 'surface alloy',
  'core-shell': 'core and shell',
};
