import { atomicHeat, atopHeat, dicoordinatedMolecularHeat, intermediateMolecularHeat, strongMolecularHeat, weakMolecularHeat } from '#shared/kinetics/heat-of-adsorption.ts';
import { swainSchaadFromDT } from '#shared/kinetics/kie-swain-schaad.ts';
import { checkConsistency, cycleClosure, enthalpyFromBarriers } from '#shared/kinetics/thermo-consistency.ts';
import { measures, run, type Kind } from './reference-measure.ts';
import type { ReferenceCase } from './reference.ts';

const number = (item: ReferenceCase, name: string): number => Number(item.input[name]);
const numbers = (item: ReferenceCase, name: string): number[] => (item.input[name] as unknown as string[]).map(Number);
const gas = (item: ReferenceCase) => ({ molarMassGPerMol: number(item, 'molar_mass_g_mol'), temperatureK: number(item, 'T_K') });
const onSurface = (item: ReferenceCase) => ({ ...gas(item), siteDensityPerM2: number(item, 'site_density_cm-2') * 1e4 });

const models = [['FE', 'fixed'], ['DL', 'dersimonian-laird'], ['PM', 'paule-mandel'], ['REML', 'reml']] as const;
interface ModelExpected {
  mean: number;
  se: number;
  tau2: number;
  ci95_normal: [number, number];
  I2_tau2_percent?: number;
  knapp_hartung?: { ci95: [number, number] } | null;
}

const pooled: Kind = ({ input, expected }) => {
  const { value, u } = input as unknown as { value: number[]; u: number[] };
  const values = value.map((one, i) => ({ value: one, u: u[i] }));
  return models.flatMap(([key, model]) => {
    const wanted = expected[key] as ModelExpected;
    const normal = run('pool', { values, model, interval: 'normal' });
    const interval = normal.interval as [number, number];
    return measures([
      [`${model}: mean`, normal.mean, wanted.mean], [`${model}: u(mean)`, normal.standardError, wanted.se], [`${model}: τ²`, normal.tau2, model === 'fixed' ? null : wanted.tau2],
      [`${model}: lower end`, interval[0], wanted.ci95_normal[0]], [`${model}: upper end`, interval[1], wanted.ci95_normal[1]],
      [`${model}: Q`, normal.q, expected.Q], [`${model}: I²`, normal.i2Percent, value.length > 1 ? expected.I2_Q_percent : null],
    ]);
  });
};

const bigeleisenMayer: Kind = (item) => {
  const found = run('kie', {
    method: 'bigeleisen-mayer', temperatureK: number(item, 'T_K'), reactantLightPerCm: numbers(item, 'reactant_light_cm-1'), reactantHeavyPerCm: numbers(item, 'reactant_heavy_cm-1'),
    transitionLightPerCm: numbers(item, 'ts_light_real_cm-1'), transitionHeavyPerCm: numbers(item, 'ts_heavy_real_cm-1'),
    imaginaryLightPerCm: number(item, 'ts_imag_light_cm-1'), imaginaryHeavyPerCm: number(item, 'ts_imag_heavy_cm-1'),
  });
  const factors = found.factors as { imaginaryRatio: number; productRule: number; excitation: number; zeroPoint: number };
  return measures([
    ['kie', found.kie, item.expected.kL_over_kH], ['imaginary ratio × product rule', factors.imaginaryRatio * factors.productRule, item.expected.MMI],
    ['excitation', factors.excitation, item.expected.EXC], ['zero point', factors.zeroPoint, item.expected.ZPE],
  ]);
};

const kcal = (item: ReferenceCase, more: Record<string, unknown>) => ({
  process: 'dissociation', dissociationEnergy: number(item, 'D_AB'), heatA: number(item, 'Q_A'), heatB: number(item, 'Q_B'), heatAB: number(item, 'Q_AB'), unit: 'kcal/mol', ...more,
});
export const surfaceKinds: Record<string, Record<string, Kind>> = {
  gas_surface: {
    flux: (item) => {
      const found = run('collision', { ...gas(item), pressurePa: number(item, 'p_Pa') });
      return measures([['flux', found.fluxPerM2S, item.expected['flux_m-2_s-1']], ['mean speed', found.meanSpeedMPerS, item.expected.mean_speed_m_s], ['number density', found.numberDensityPerM3, item.expected['number_density_m-3']]]);
    },
    monolayer_time: (item) => {
      const found = run('collision', { ...onSurface(item), pressurePa: number(item, 'p_Pa'), sticking: number(item, 'sticking') });
      return measures([['collisions per site', found.collisionsPerSiteS, item.expected['impingement_per_site_s-1']], ['time', found.monolayerTimeS, item.expected.seconds_per_monolayer_at_unit_sticking]]);
    },
    sticking_to_rate_constant: (item) => {
      const found = run('collision', { ...onSurface(item), sticking: number(item, 'sticking') });
      return measures([['k per Pa', found.kAdsPerPaS, item.expected['k_Pa-1_s-1']], ['k per bar', found.kAdsPerBarS, item.expected['k_bar-1_s-1']], ['k per Torr', found.kAdsPerTorrS, item.expected['k_Torr-1_s-1']], ['k in m3/mol', found.kAdsM3PerMolS, item.expected['k_m3_mol-1_s-1']], ['k in m/s', found.kAdsMPerS, item.expected.k_areal_m_s]]);
    },
    rate_constant_to_sticking: (item) => measures([['s0', run('collision', { ...onSurface(item), kAdsPerPaS: number(item, 'k_Pa-1_s-1') }).sticking, item.expected.sticking]]),
    activated_sticking: (item) => {
      const found = run('collision', { ...onSurface(item), stickingFactor: number(item, 's0'), stickingEnergyKJPerMol: number(item, 'Es_J_mol') / 1000 });
      return measures([['s', found.sticking, item.expected.sticking], ['k', found.kAdsPerPaS, item.expected['k_Pa-1_s-1']], ['E of k_p', found.energyPressureKJPerMol, item.expected.Ea_of_k_p_J_mol, 1000], ['E of k_c', found.energyConcentrationKJPerMol, item.expected.Ea_of_k_c_J_mol, 1000]]);
    },
    langmuir_exposure: (item) => {
      const found = run('collision', { molarMassGPerMol: 28, temperatureK: 300, exposureLangmuir: number(item, 'exposure_L'), pressurePa: number(item, 'p_Pa') });
      return measures([['exposure', found.exposurePaS, item.expected.exposure_Pa_s], ['time', found.exposureTimeS, item.expected.time_s]]);
    },
  },
  kie: {
    zpe_only: (item) => {
      const light = number(item, 'nu_H_cm-1');
      const heavy = item.input['nu_D_cm-1'] === 'nu_H/sqrt(2)' ? light / Math.SQRT2 : number(item, 'nu_D_cm-1');
      const found = run('kie', { method: 'zero-point', wavenumberLightPerCm: light, wavenumberHeavyPerCm: heavy, temperatureK: number(item, 'T_K') });
      return measures([['kie', found.kie, item.expected.kH_over_kD], ['zero-point difference', found.zeroPointDifferenceKJPerMol, item.expected.delta_zpe_J_mol, 1000]]);
    },
    bigeleisen_mayer: bigeleisenMayer,
    arrhenius_pair: (item) => {
      const found = run('kie', {
        method: 'arrhenius-pair', temperatureK: number(item, 'T_K'), preExponentialLight: number(item, 'A_H'), energyLightKJPerMol: number(item, 'Ea_H_J_mol') / 1000,
        preExponentialHeavy: number(item, 'A_D'), energyHeavyKJPerMol: number(item, 'Ea_D_J_mol') / 1000,
      });
      return measures([['kie', found.kie, item.expected.kH_over_kD], ['ln kie', found.lnKie, item.expected.ln_KIE]]);
    },
    kie_two_temperatures: (item) => {
      const found = run('kie', { method: 'two-temperatures', kie1: number(item, 'KIE1'), temperature1K: number(item, 'T1_K'), kie2: number(item, 'KIE2'), temperature2K: number(item, 'T2_K'), temperatureK: 350 });
      return measures([['ratio of A', found.preExponentialRatio, item.expected.A_ratio], ['difference of E', found.energyDifferenceKJPerMol, item.expected.dEa_D_minus_H_J_mol, 1000]]);
    },
    wigner: (item) => {
      const found = run('tunnelling', { model: 'wigner', imaginaryPerCm: number(item, 'nu_imag_cm-1'), temperatureK: number(item, 'T_K') });
      return measures([['κ', found.kappa, item.expected.kappa], ['u', found.u, item.expected.u]]);
    },
    wigner_kie: (item) => measures([['ratio of κ', run('kie', { method: 'tunnelling-ratio', model: 'wigner', imaginaryLightPerCm: number(item, 'nu_imag_H_cm-1'), imaginaryHeavyPerCm: number(item, 'nu_imag_D_cm-1'), temperatureK: number(item, 'T_K') }).kie, item.expected.kappa_H_over_kappa_D]]),
    bell: (item) => {
      const input = { imaginaryPerCm: number(item, 'nu_imag_cm-1'), temperatureK: number(item, 'T_K'), energyKJPerMol: number(item, 'E_J_mol') / 1000 };
      return measures([['κ of 1935', run('tunnelling', { model: 'bell-1935', ...input }).kappa, item.expected.Q_Bell_1935], ['κ of 1959', run('tunnelling', { model: 'bell-1959', ...input }).kappa, item.expected.Q_Bell_1959]]);
    },
    swain_schaad: (item) => {
      const found = run('kie', { method: 'swain-schaad', kie: number(item, 'kH_over_kD'), exponent: number(item, 'exponent') });
      return measures([['kH/kT', found.kie, item.expected.kH_over_kT], ['kD/kT', found.kieDT, item.expected.kD_over_kT]]);
    },
    swain_schaad_from_DT: (item) => measures([
      ['kH/kT', run('kie', { method: 'swain-schaad-from-dt', kie: number(item, 'kD_over_kT') }).kie, item.expected.kH_over_kT],
      ['kH/kT by 1.442', swainSchaadFromDT({ kie: number(item, 'kD_over_kT'), exponent: 1.442 / 0.442 }).kie, item.expected['kH_over_kT_from_1.442']],
    ]),
  },
  pooled: { pooled },
  // The file leaves barriers unbounded; the product bounds each below by max(0, ΔH) of its own process and gives the other as well.
  bocmp: {
    bocmp_dissociation: (item) => {
      const { expected } = item;
      const gasPhase = run('bond-order', kcal(item, { form: 'early', from: 'gas' }));
      const adsorbed = run('bond-order', kcal(item, { form: 'early', from: 'adsorbed' }));
      return measures([
        ['barrier from the gas', gasPhase.unboundedBarrier, expected.E_gas], ['barrier from the adsorbed state', adsorbed.unboundedBarrier, expected.E_adsorbed],
        ['ΔH from the gas', gasPhase.reactionEnergy, expected.dH_gas_to_adsorbed_atoms], ['ΔH from the adsorbed state', adsorbed.reactionEnergy, expected.dH_adsorbed_to_adsorbed_atoms],
      ]);
    },
    bocmp_recombination: (item) => measures([
      ['to the gas', run('bond-order', kcal(item, { form: 'early', from: 'gas' })).unboundedReverseBarrier, item.expected.E_recombination_to_gas_unclamped],
      ['to the adsorbed molecule', run('bond-order', kcal(item, { form: 'early', from: 'adsorbed' })).unboundedReverseBarrier, item.expected.E_recombination_to_adsorbed_unclamped],
    ]),
    ubiqep_dissociation: (item) => {
      const { expected } = item;
      const form = { form: 'interpolated', interpolation: number(item, 'phi') };
      const adsorbed = run('bond-order', kcal(item, { ...form, from: 'adsorbed' }));
      return measures([
        ['barrier from the adsorbed state', adsorbed.unboundedBarrier, expected.E_adsorbed], ['barrier from the gas', run('bond-order', kcal(item, { ...form, from: 'gas' })).unboundedBarrier, expected.E_gas],
        ['ΔH', adsorbed.reactionEnergy, expected.dH_adsorbed], ['reverse', adsorbed.unboundedReverseBarrier, expected.E_reverse_from_adsorbed_atoms_to_adsorbed_AB],
      ]);
    },
    atomic_heat: (item) => measures([['Q_A', atomicHeat({ atopHeat: number(item, 'Q0A'), coordination: number(item, 'n') }), item.expected.Q_A]]),
    atomic_heat_inverse: (item) => measures([['Q0A', atopHeat({ heat: number(item, 'Q_A'), coordination: number(item, 'n') }), item.expected.Q0A]]),
    molecular_heat: (item) => {
      const molecule = { atopHeat: number(item, 'Q0A'), coordination: number(item, 'n'), bondEnergy: number(item, 'D_AB') };
      return measures([['weak', weakMolecularHeat(molecule), item.expected.Q_AB_weak], ['strong', strongMolecularHeat(molecule), item.expected.Q_AB_strong], ['intermediate', intermediateMolecularHeat(molecule), item.expected.Q_AB_intermediate_mean]]);
    },
    molecular_heat_dicoordinated: (item) => measures([['Q_AB', dicoordinatedMolecularHeat({ atopHeatA: number(item, 'Q0A'), atopHeatB: number(item, 'Q0B'), bondEnergy: number(item, 'D_AB') }), item.expected.Q_AB]]),
  },
  thermo_consistency: {
    reverse_barrier: (item) => measures([['E reverse', run('reverse', { energyForwardKJPerMol: number(item, 'Ea_fwd_kJ_mol'), reactionEnthalpyKJPerMol: number(item, 'dH_kJ_mol') }).energyReverseKJPerMol, item.expected.Ea_rev_kJ_mol]]),
    reverse_rate_constant: (item) => {
      const found = run('reverse', {
        energyForwardKJPerMol: number(item, 'Ea_fwd_J_mol') / 1000, reactionEnthalpyKJPerMol: number(item, 'dH_J_mol') / 1000, reactionEntropyJPerMolK: number(item, 'dS_J_mol_K'),
        preExponentialForward: number(item, 'A_fwd'), temperatureK: number(item, 'T_K'),
      });
      return measures([
        ['A reverse', found.preExponentialReverse, item.expected.A_rev], ['E reverse', found.energyReverseKJPerMol, item.expected.Ea_rev_J_mol, 1000], ['k reverse', found.kReverse, item.expected.k_rev],
        ['K', found.equilibriumConstant, item.expected.K], ['ΔG', found.gibbsKJPerMol, item.expected.dG_J_mol, 1000],
      ]);
    },
    desorption_from_adsorption: (item) => {
      const found = run('reverse', {
        energyForwardKJPerMol: 0, preExponentialForward: number(item, 'k_ads_Pa-1_s-1'), reactionEnthalpyKJPerMol: number(item, 'dH_ads_J_mol') / 1000, reactionEntropyJPerMolK: number(item, 'dS_ads_J_mol_K_at_1bar'),
        gasMoleChange: -1, temperatureK: number(item, 'T_K'),
      });
      return measures([['k of desorption', found.kReverse, item.expected['k_des_s-1']], ['K', found.equilibriumConstant, item.expected.K0]]);
    },
    gas_adsorption_reverse_barrier: (item) => {
      const shared = { energyForwardKJPerMol: number(item, 'Ea_ads_from_k_p_J_mol') / 1000, reactionEnthalpyKJPerMol: number(item, 'dH_ads_J_mol') / 1000, gasMoleChange: -1, temperatureK: number(item, 'T_K') };
      const concentration = run('reverse', { ...shared, exponentForward: 1, basis: 'concentration' });
      return measures([
        ['E of desorption', run('reverse', shared).localEnergyReverseKJPerMol, item.expected.Ea_des_J_mol, 1000], ['E of k_c', concentration.localEnergyForwardKJPerMol, item.expected.Ea_ads_from_k_c_J_mol, 1000],
        ['E of desorption, concentrations', concentration.localEnergyReverseKJPerMol, item.expected.Ea_des_J_mol, 1000],
      ]);
    },
    enthalpy_from_barriers: (item) => measures([['ΔH', enthalpyFromBarriers({ energyForwardKJPerMol: number(item, 'Ea_fwd_kJ_mol'), energyReverseKJPerMol: number(item, 'Ea_rev_kJ_mol') }), item.expected.dH_kJ_mol]]),
    consistency_check: (item) => {
      const found = checkConsistency({
        energyForwardKJPerMol: number(item, 'Ea_fwd_kJ_mol'), energyReverseKJPerMol: number(item, 'Ea_rev_kJ_mol'), reactionEnthalpyKJPerMol: number(item, 'dH_kJ_mol'),
        uEnergyForwardKJPerMol: number(item, 'u_fwd'), uEnergyReverseKJPerMol: number(item, 'u_rev'), uReactionEnthalpyKJPerMol: number(item, 'u_dH'),
      });
      return measures([['closure error', found.closureErrorKJPerMol, item.expected.closure_error_kJ_mol], ['its uncertainty', found.uClosureKJPerMol, item.expected.u_closure_kJ_mol], ['normalised error', found.normalizedError, item.expected.E_n]]);
    },
    cycle_closure: (item) => measures([['sum', cycleClosure(numbers(item, 'dH_kJ_mol').map((enthalpyKJPerMol) => ({ enthalpyKJPerMol }))).sumKJPerMol, item.expected.sum_kJ_mol]]),
  },
};
