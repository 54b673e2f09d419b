import { N_A, R } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { requirePositive, requireTemperature } from './kinetics-error.ts';
import type { QuantityContext } from './quantity-symbols.ts';
import { unitOfBasis, type RateBasis } from './rate-basis.ts';
import type { ReportedOrders } from './rate-law.ts';

/** The way from SI of the printed unit to the site basis, or what is missing for it. */
export interface SiteBasis {
  /** Multiplier on the SI value; null when something is missing. */
  factor: number | null;
  unit: string | null;
  missing: string[];
  /** Change of the exponent n that goes with a pre-exponential factor brought from concentration to pressure. */
  exponentChange: number;
  lines: DerivationLine[];
}

/**
 * Brings a rate constant or pre-exponential factor in SI to the site basis (s-1 Pa^-g with coverages).
 *
 * k_site = k Γ^(q-a); gas concentrations become pressures by k_p = k_c/(RT)^g at T for a rate constant and by
 * A_p = A_c/(R T0)^g with n_p = n - g for a pre-exponential factor; a rate per mass is divided by the sites per mass;
 * monolayers become coverages only where 1 ML is one per site; k_site = k_rel θ_sat^(1-s).
 * Source: rate per area = site density × rate per site; IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149.
 */
export function toSiteBasis(si: number, basis: RateBasis, orders: ReportedOrders | null, context: QuantityContext, temperatureForm: 'single' | 'pre-exponential'): SiteBasis {
  const missing: string[] = [];
  const lines: DerivationLine[] = [];
  let factor = 1;
  let exponentChange = 0;
  let current = { ...basis, omittedMolecule: 0 };
  const step = (operation: string, multiplier: number, next: RateBasis, reference: string, extra: { constant?: string; assumption?: string }): void => {
    const from = { value: si * factor, unit: unitOfBasis(current).symbol };
    factor *= multiplier;
    current = next;
    lines.push(operationLine(operation, from, { value: si * factor, unit: unitOfBasis(current).symbol }, reference, extra));
  };
  if (basis.gasConcentration !== 0) {
    const g = basis.gasConcentration;
    const next = { ...current, gasConcentration: 0, gasPressure: Number((basis.gasPressure + g).toPrecision(12)) };
    if (temperatureForm === 'pre-exponential') {
      const T0 = requireTemperature('referenceTemperatureK', context.referenceTemperatureK ?? 1, 'T0');
      exponentChange = -g;
      step(`A_p = A_c/(R T0)^${g}; the exponent n becomes n - ${g}, E unchanged`, (R * T0) ** -g, next, references.idealGas, {
        constant: `R = ${R} J mol-1 K-1`,
        assumption: `ideal gas; T0 = ${T0} K${context.referenceTemperatureK == null ? ', as none is stated' : ''}`,
      });
    } else if (context.temperatureK == null) missing.push('temperature');
    else {
      const T = requireTemperature('temperatureK', context.temperatureK);
      step(`Divide by (RT)^${g}`, (R * T) ** -g, next, references.idealGas, { constant: `R = ${R} J mol-1 K-1`, assumption: `ideal gas at T = ${T} K` });
    }
  }
  if (basis.areal !== 0) {
    if (context.siteDensityPerM2 == null) missing.push('site density');
    else {
      const density = requirePositive('siteDensityPerM2', context.siteDensityPerM2, 'site density', 'm-2');
      step(`Multiply by the site density to the power ${basis.areal}`, (density / N_A) ** basis.areal, { ...current, areal: 0 }, references.siteBalance, {
        constant: `N_A = ${quantityText(N_A)} mol-1`,
        assumption: `site density ${quantityText(density)} m-2${context.siteDensitySource ? `, ${context.siteDensitySource}` : ', given'}`,
      });
    }
  }
  if (basis.perMass !== 0) {
    if (context.sitesPerKg == null) missing.push('sites per mass');
    else {
      const sites = requirePositive('sitesPerKg', context.sitesPerKg, 'sites per mass', 'kg-1');
      step('Divide by the sites per mass', N_A / sites, { ...current, perMass: 0 }, references.siteBalance, { constant: `N_A = ${quantityText(N_A)} mol-1`, assumption: `${sites} sites per kg of catalyst, given` });
    }
  }
  if (basis.coverage !== 0) {
    if (context.coverageDefinition !== 'per-adsorption-site') missing.push('coverage definition: 1 ML as one per site');
    else step('Read 1 ML as one per site', 1, { ...current, coverage: 0 }, references.siteBalance, { assumption: 'coverage is counted per adsorption site' });
  } else if (context.coverageDefinition === 'relative-to-saturation' && orders !== null && orders.surface !== 0 && orders.surface !== 1 && basis.areal === 0) {
    if (context.saturationCoverage == null) missing.push('saturation coverage');
    else {
      const saturation = requirePositive('saturationCoverage', context.saturationCoverage, 'saturation coverage');
      step(`k_site = k_rel θ_sat^${1 - orders.surface}`, saturation ** (1 - orders.surface), current, references.siteBalance, { assumption: `coverage relative to saturation, saturation at ${saturation} per site` });
    }
  }
  if (missing.length > 0) return { factor: null, unit: null, missing, exponentChange: 0, lines: [] };
  return { factor, unit: unitOfBasis(current).symbol, missing, exponentChange, lines };
}
