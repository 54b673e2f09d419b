import * as z from 'zod';
import { collisionFlux, langmuirExposure, meanSpeed, monolayerTime } from '../kinetics/collision.ts';
import { N_A, R } from '../kinetics/constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from '../kinetics/derivation.ts';
import { KineticsError } from '../kinetics/kinetics-error.ts';
import { activatedSticking, adsorptionConstant, collisionLimit, stickingFromRateConstant, type AdsorptionConstant, type GasSurface } from '../kinetics/sticking.ts';
import { requireSticking } from '../kinetics/sticking-coefficient.ts';
import { calculator } from './calculator.ts';

const input = z.strictObject({
  molarMassGPerMol: z.number(), temperatureK: z.number(), pressurePa: z.number().optional(), siteDensityPerM2: z.number().optional(), sticking: z.number().optional(),
  stickingFactor: z.number().optional(), stickingEnergyKJPerMol: z.number().optional(), kAdsPerPaS: z.number().optional(), exposureLangmuir: z.number().optional(),
});
type CollisionInput = z.output<typeof input>;

/** Some of the results, with the lines that lead to them. */
interface Part {
  derivation: DerivationLine[];
  sticking?: number;
}

function meanSpeedOf({ molarMassGPerMol, temperatureK }: CollisionInput): { meanSpeedMPerS: number; derivation: DerivationLine[] } {
  const meanSpeedMPerS = meanSpeed({ molarMassGPerMol, temperatureK });
  const line = operationLine(`Mean speed √(8RT/πM), T = ${quantityText(temperatureK)} K`, { value: molarMassGPerMol, unit: 'g/mol' }, { value: meanSpeedMPerS, unit: 'm s-1' }, references.greenBook, { constant: `R = ${R} J mol-1 K-1` });
  return { meanSpeedMPerS, derivation: [line] };
}

function needed<Name extends keyof CollisionInput>(given: CollisionInput, name: Name, why: string): NonNullable<CollisionInput[Name]> {
  const value = given[name];
  if (value === undefined) throw new KineticsError(name, `${name} is needed ${why}`, 'missing-input');
  return value;
}

/** How sticking is given: as s0, as A_s with E_s, or by a rate constant; one way at a time. */
function stickingWay(given: CollisionInput): 'initial' | 'activated' | 'rate-constant' | null {
  const ways = [
    given.sticking !== undefined && (['sticking', 'initial'] as const),
    (given.stickingFactor !== undefined || given.stickingEnergyKJPerMol !== undefined) && (['stickingFactor', 'activated'] as const),
    given.kAdsPerPaS !== undefined && (['kAdsPerPaS', 'rate-constant'] as const),
  ].filter((way) => way !== false);
  const [first, second] = ways;
  if (second) throw new KineticsError(second[0], 'give the sticking in one way only: sticking, stickingFactor with stickingEnergyKJPerMol, or kAdsPerPaS', 'out-of-range');
  return first?.[1] ?? null;
}

function limitLine({ temperatureK, siteDensityPerM2, molarMassGPerMol }: GasSurface, limit: number): DerivationLine {
  const operation = `Collision limit N_A/(Γ √(2π M R T)), M = ${quantityText(molarMassGPerMol)} g/mol, T = ${quantityText(temperatureK)} K`;
  return operationLine(operation, { value: siteDensityPerM2, unit: 'm-2' }, { value: limit, unit: 'Pa-1 s-1' }, 'Hertz–Knudsen equation, kinetic theory of gases', { constant: `R = ${R} J mol-1 K-1, N_A = ${quantityText(N_A)} mol-1` });
}

function activatedInput(given: CollisionInput): { stickingFactor: number; stickingEnergyKJPerMol: number } {
  const why = 'for s = A_s exp(-E_s/RT)';
  return { stickingFactor: needed(given, 'stickingFactor', why), stickingEnergyKJPerMol: needed(given, 'stickingEnergyKJPerMol', why) };
}

/** What sticking makes with the site density; without one an initial sticking coefficient is only checked. */
function stickingPart(given: CollisionInput): (Part & Partial<AdsorptionConstant>) | null {
  const way = stickingWay(given);
  const { molarMassGPerMol, temperatureK } = given;
  const sticking = way === 'initial' ? requireSticking('sticking', given.sticking as number) : undefined;
  if (given.siteDensityPerM2 === undefined && (way === null || sticking !== undefined)) return null;
  const gas = { molarMassGPerMol, temperatureK, siteDensityPerM2: needed(given, 'siteDensityPerM2', 'to go between sticking and a rate constant per site') };
  const limit = { collisionLimitPerPaS: collisionLimit(gas) };
  if (sticking !== undefined) return { ...limit, ...adsorptionConstant({ ...gas, sticking }) };
  if (way === 'rate-constant') return { ...limit, kAdsPerPaS: given.kAdsPerPaS, ...stickingFromRateConstant({ ...gas, kAdsPerPaS: given.kAdsPerPaS as number }) };
  return way === 'activated' ? { ...limit, ...activatedSticking({ ...gas, ...activatedInput(given) }) } : { ...limit, derivation: [limitLine(gas, limit.collisionLimitPerPaS)] };
}

/** What the pressure makes: the flux and, with a site density, collisions per site and the time of a monolayer at constant sticking, 1 when none is known. */
function pressurePart({ molarMassGPerMol, temperatureK, pressurePa, siteDensityPerM2 }: CollisionInput, sticking: number): Part | null {
  if (pressurePa === undefined) return null;
  const gas = { molarMassGPerMol, temperatureK, pressurePa };
  const flux = collisionFlux(gas);
  const fills = pressurePa > 0 && sticking > 0 && sticking <= 1;
  return siteDensityPerM2 !== undefined && fills ? { ...flux, ...monolayerTime({ ...gas, siteDensityPerM2, sticking }) } : { ...flux };
}

function exposurePart({ exposureLangmuir, pressurePa }: CollisionInput) {
  if (exposureLangmuir === undefined) return null;
  const { exposurePaS, timeS, derivation } = langmuirExposure({ exposureLangmuir, pressurePa });
  return { exposurePaS, ...(timeS === null ? {} : { exposureTimeS: timeS }), derivation };
}

export const collisionCalculator = calculator({
  name: 'collision',
  title: 'Collisions with a surface',
  summary: 'Finds the flux of a gas on a surface, and the rate constant of adsorption that goes with a sticking coefficient.',
  formulas: ['Z = p/√(2π m k_B T)', 'k_{ads} = s_0/(Γ√(2π m k_B T))', 's = A_s exp(−E_s/RT)', 'E(k_p) = E_s − RT/2, E(k_c) = E_s + RT/2', '1 L = 10^{−6} Torr s'],
  validity: 'Ideal gas at its own temperature T. s0 is the initial sticking coefficient per molecule, at zero coverage, from 0 to 1; it is not the factor A_{s} of activated sticking. A beam value at one energy and angle is not thermal: no rate constant is made from it.',
  references: ['Hertz–Knudsen equation, kinetic theory of gases', 'IUPAC Green Book, 3rd edition'],
  input,
  output: z.object({
    meanSpeedMPerS: z.number(),
    fluxPerM2S: z.number().optional(), numberDensityPerM3: z.number().optional(), collisionsPerSiteS: z.number().optional(), monolayerTimeS: z.number().optional(),
    collisionLimitPerPaS: z.number().optional(), kAdsPerPaS: z.number().optional(), kAdsPerBarS: z.number().optional(), kAdsPerTorrS: z.number().optional(),
    kAdsM3PerMolS: z.number().optional(), kAdsMPerS: z.number().optional(),
    sticking: z.number().optional(), aboveOne: z.boolean().optional(), warnings: z.array(z.string()).optional(),
    energyPressureKJPerMol: z.number().optional(), energyConcentrationKJPerMol: z.number().optional(), preExponentialPerPaS: z.number().optional(),
    exposurePaS: z.number().optional(), exposureTimeS: z.number().optional(),
  }),
  calculate: (given) => {
    const speed = meanSpeedOf(given);
    const adsorption = stickingPart(given);
    const known = adsorption?.sticking ?? given.sticking ?? 1;
    const parts = [speed, pressurePart(given, known), adsorption, exposurePart(given)].filter((part) => part !== null);
    return { ...Object.assign({}, ...parts) as typeof speed, derivation: parts.flatMap(({ derivation }) => derivation) };
  },
});
