import { rateParameters } from '#shared/assessment/rate-at-temperature.ts';
import { h, k_B } from '#shared/kinetics/constants.ts';
import { fitLine } from '#shared/kinetics/least-squares.ts';
import { convertQuantity } from '#shared/kinetics/quantity.ts';
import { differenceUncertainty, standardUncertaintyOf } from '#shared/kinetics/uncertainty.ts';
import { measures, run, type Kind } from './reference-measure.ts';
import { rateUnitInput, type ReferenceCase } from './reference.ts';

/** Rate constants and what they are made from; surfaces and gases stand in `reference-kinds-surface.ts`. */
const number = (item: ReferenceCase, name: string): number => Number(item.input[name]);
const arrheniusInput = (item: ReferenceCase) => ({
  preExponential: number(item, 'A'), exponent: number(item, 'n'), referenceTemperatureK: number(item, 'Tref_K'), energyKJPerMol: number(item, 'Ea_J_mol') / 1000, temperatureK: number(item, 'T_K'),
});

const eyring = (phase: 'surface' | 'gas', molecularity: 1 | 2): Kind => (item) => {
  const { input, expected } = item;
  const system = { temperatureK: number(item, 'T_K'), phase, molecularity, ...(input.standard_state === undefined ? {} : { standardState: input.standard_state }) };
  if (input.dH_J_mol === undefined) {
    const back = run('eyring', { direction: 'to-eyring', preExponential: Number(input['A_s-1'] ?? input['A_m3_mol-1_s-1']), energyKJPerMol: number(item, 'Ea_J_mol') / 1000, ...system });
    return measures([['ΔH‡', back.enthalpyKJPerMol, expected.dH_J_mol, 1000], ['ΔS‡', back.entropyJPerMolK, expected.dS_J_mol_K], ['ΔG‡', back.gibbsKJPerMol, expected.dG_J_mol, 1000]]);
  }
  const there = run('eyring', { direction: 'to-arrhenius', enthalpyKJPerMol: number(item, 'dH_J_mol') / 1000, entropyJPerMolK: number(item, 'dS_J_mol_K'), ...system });
  const other = input.standard_state === '1 bar' ? '1 mol/L' : '1 bar';
  const otherEntropy = phase === 'gas' ? run('eyring', { direction: 'to-eyring', preExponential: there.preExponential, energyKJPerMol: there.energyKJPerMol, ...system, standardState: other }).entropyJPerMolK : null;
  return measures([
    ['k', there.k, expected['k_s-1'] ?? expected['k_m3_mol-1_s-1'] ?? expected.k], ['A', there.preExponential, expected['A_s-1'] ?? expected['A_m3_mol-1_s-1'] ?? expected.A],
    ['E', there.energyKJPerMol, expected.Ea_J_mol, 1000], ['ΔG‡', there.gibbsKJPerMol, expected.dG_J_mol, 1000], ['ΔS‡ at the other standard state', otherEntropy, expected.dS_other_standard_state_J_mol_K],
  ]);
};

const fit: Kind = ({ input, expected }) => {
  const data = input as unknown as { T_K: number[]; k: number[]; sigma_k: number[] | null };
  return Object.entries(expected).flatMap(([covariance, figures]) => {
    const wanted = figures as Record<string, number | null> & { ci95_ln_A: [number, number] | null; ci95_Ea_J_mol: [number, number] | null };
    const found = run('fit', {
      points: data.T_K.map((temperatureK, i) => ({ temperatureK, k: data.k[i], ...(data.sigma_k ? { u: data.sigma_k[i] } : {}) })),
      weights: data.sigma_k ? 'given' : 'none', covariance: covariance === 'scaled' ? 'scaled' : 'absolute',
    });
    const parameters = measures([['ln A', found.lnPreExponential, wanted.ln_A], ['E', found.energyKJPerMol, wanted.Ea_J_mol, 1000], ['correlation', found.correlation, wanted.correlation_lnA_Ea]]);
    // The residuals of an exact line are rounding noise in both programs.
    if ((wanted.residual_sd_lnk ?? 0) < 1e-12) return parameters;
    const ends = (name: string, actual: unknown, pair: [number, number] | null, scale = 1) => [0, 1].map((end) => [`${name}, end ${end + 1}`, (actual as [number, number] | null)?.[end], pair?.[end], scale] as const);
    return [
      ...parameters,
      ...measures([
        ['u(ln A)', found.uLnPreExponential, wanted.se_ln_A], ['u(E)', found.uEnergyKJPerMol, wanted.se_Ea_J_mol, 1000], ['residual', found.residualSd, wanted.residual_sd_lnk], ['R²', found.rSquared, wanted.R2],
        ...ends('interval of ln A', found.ciLnPreExponential, wanted.ci95_ln_A), ...ends('interval of E', found.ciEnergyKJPerMol, wanted.ci95_Ea_J_mol, 1000),
      ]),
    ];
  });
};

/** The other certified set is a polynomial or has several regressors: the product fits straight lines. */
const certifiedLine: Kind = ({ input, expected }) => {
  const { x, y } = input as unknown as { x?: number[]; y: number[] };
  const { B, rss, R2 } = expected as { B: number[]; rss: number; R2: number };
  if (x === undefined || B.length !== 2) return [];
  const line = fitLine(x, y);
  return measures([['B0', line.intercept, B[0]], ['B1', line.slope, B[1]], ['sum of squares', line.rss, rss], ['R²', line.rSquared, R2]]);
};

const uncertainty = (make: (item: ReferenceCase) => Record<string, unknown>, wanted = 'u'): Kind => (item) => measures([['u', run('uncertainty', make(item)).standardUncertainty, item.expected[wanted]]]);

/** ln A and u(ln A) as an entry holds them, from a pre-exponential factor as printed. */
function logarithmOf(asPrinted: string) {
  const common = { coverageFactor: null };
  const factor = convertQuantity({ symbol: 'preExponential', asPrinted, unitAsPrinted: 's-1', uncertaintyKind: 'standard', ...common }, { gasOrder: 0, surfaceOrder: 1 });
  const energy = convertQuantity({ symbol: 'energy', asPrinted: '0', unitAsPrinted: 'kJ/mol', ...common }, {});
  return rateParameters([{ ...factor, energyType: null }, { ...energy, energyType: 'arrhenius' }]);
}

export const kinds: Record<string, Record<string, Kind>> = {
  energy_units: {
    '*': ({ input, expected }) => measures([['value', run('energy', { value: Number(input.value), from: input.from, to: input.to }).value, expected.value]]),
  },
  rate_units: {
    '*': (item) => measures([['value', run('rate-constant', JSON.parse(JSON.stringify(rateUnitInput(item))) as Record<string, unknown>).value, item.expected.value]]),
  },
  site_density: {
    '*': ({ input, expected }) => {
      const found = run('site-density', { structure: input.structure, facet: input.face, aAngstrom: Number(input.a_A) });
      return measures([['per m2', found.perM2, expected.sites_per_m2], ['per cm2', found.perCm2, expected.sites_per_cm2], ['mol per m2', found.molPerM2, expected.mol_per_m2]]);
    },
  },
  arrhenius: {
    k_of_T: (item) => {
      const { k, lnK } = run('arrhenius', arrheniusInput(item));
      return measures([['ln k', lnK, item.expected.ln_k], ['k', k, item.expected.k_outside_double_range === false ? item.expected.k : null]]);
    },
    local_activation_energy: (item) => measures([['E local', run('arrhenius', arrheniusInput(item)).localEnergyKJPerMol, item.expected.Ea_local_J_mol, 1000]]),
    kBT_over_h_prefactor: (item) => {
      const found = run('arrhenius', { preExponential: k_B / h, exponent: 1, energyKJPerMol: number(item, 'E0_J_mol') / 1000, temperatureK: number(item, 'T_K') });
      return measures([['ln k', found.lnK, item.expected.ln_k], ['k', found.k, item.expected.k], ['E local', found.localEnergyKJPerMol, item.expected.Ea_local_J_mol, 1000]]);
    },
    two_temperature_inversion: (item) => {
      const found = run('two-temperature', { k1: number(item, 'k1'), temperature1K: number(item, 'T1_K'), k2: number(item, 'k2'), temperature2K: number(item, 'T2_K') });
      return measures([['E', found.energyKJPerMol, item.expected.Ea_J_mol, 1000], ['ln A', found.lnPreExponential, item.expected.ln_A]]);
    },
    eyring_to_arrhenius_unimolecular_or_surface: eyring('surface', 1),
    arrhenius_to_eyring_unimolecular_or_surface: eyring('surface', 1),
    eyring_to_arrhenius_surface_bimolecular: eyring('surface', 2),
    eyring_to_arrhenius_gas_bimolecular: eyring('gas', 2),
    arrhenius_to_eyring_gas_bimolecular: eyring('gas', 2),
  },
  arrhenius_fit: { lnk_on_invT_weighted: fit, lnk_on_invT_unweighted: fit, nist_strd: certifiedLine },
  uncertainty: {
    k_from_correlated_lnA_Ea: (item) => {
      const found = run('arrhenius', {
        preExponential: Math.exp(number(item, 'ln_A')), energyKJPerMol: number(item, 'Ea_J_mol') / 1000, temperatureK: number(item, 'T_K'),
        uLnPreExponential: number(item, 'u_ln_A'), uEnergyKJPerMol: number(item, 'u_Ea_J_mol') / 1000, correlation: number(item, 'r_lnA_Ea'),
      });
      return measures([['ln k', found.lnK, item.expected.ln_k], ['u(ln k)', found.uLnK, item.expected.u_ln_k]]);
    },
    A_to_lnA: (item) => {
      const found = logarithmOf(`${number(item, 'A')} ± ${number(item, 'u_A')}`.replaceAll('e+', 'e'));
      return measures([['ln A', Math.log(found?.preExponential ?? NaN), item.expected.ln_A], ['u(ln A)', found?.uLnPreExponential, item.expected.u_ln_A_first_order]]);
    },
    log10A_to_A: (item) => {
      const found = logarithmOf(`10^${item.input.log10_A}±${item.input.u_log10_A}`);
      return measures([['A', found?.preExponential, item.expected.A], ['u(ln A)', found?.uLnPreExponential, item.expected.u_ln_A]]);
    },
    expanded_to_standard: uncertainty((item) => ({ kind: 'expanded', value: number(item, 'U'), coverageFactor: number(item, 'k') })),
    confidence_interval_normal: uncertainty((item) => ({ kind: 'confidence', halfWidth: (number(item, 'upper') - number(item, 'lower')) / 2, level: number(item, 'level') })),
    confidence_interval_student_t: uncertainty((item) => ({ kind: 'confidence', halfWidth: number(item, 'half_width'), level: number(item, 'level'), degreesOfFreedom: number(item, 'df') })),
    triangular_half_width: uncertainty((item) => ({ kind: 'triangular', halfWidth: number(item, 'a') })),
    rectangular_half_width: uncertainty((item) => ({ kind: 'rectangular', halfWidth: number(item, 'a') })),
    rectangular_bounds: uncertainty((item) => ({ kind: 'rectangular', halfWidth: (number(item, 'upper') - number(item, 'lower')) / 2 })),
    digit_resolution: uncertainty((item) => ({ kind: 'rectangular', halfWidth: number(item, 'resolution') / 2 })),
    factor_uncertainty: uncertainty((item) => ({ kind: 'factor', factor: number(item, 'factor'), level: item.input.coverage === 'one_sigma' ? 0.6826894921370859 : 0.95 }), 'u_ln'),
    sd_to_standard_error: (item) => measures([['u', standardUncertaintyOf(number(item, 's'), { kind: 'spread', degreesOfFreedom: number(item, 'n') - 1 }), item.expected.u]]),
    arcsine_half_width: uncertainty((item) => ({ kind: 'arcsine', halfWidth: number(item, 'a') })),
    trapezoidal_half_width: uncertainty((item) => ({ kind: 'trapezoidal', halfWidth: number(item, 'a'), topFraction: number(item, 'beta') })),
    difference_of_barriers: (item) => measures([['u', differenceUncertainty(number(item, 'u_Ef'), number(item, 'u_Er'), number(item, 'r')), item.expected.u_dH]]),
  },
};
