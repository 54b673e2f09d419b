import { reverseCalculator } from '#shared/calculators/reverse.ts';
import type { Figure } from '../figures.ts';
import { sheet } from '../sheet.ts';
import { referenceTemperature, temperature } from './common-fields.ts';

export const reverseSheet = sheet({
  calculator: reverseCalculator,
  fields: [
    { kind: 'number', key: 'energyForwardKJPerMol', label: 'Activation energy, forward', symbol: 'E_{f}', energy: true },
    { kind: 'number', key: 'reactionEnthalpyKJPerMol', label: 'Reaction enthalpy', symbol: 'ΔH°', energy: true, hint: 'Of the same type as E: an electronic barrier goes with an electronic reaction energy.' },
    { kind: 'number', key: 'preExponentialForward', label: 'Pre-exponential factor, forward', symbol: 'A_{f}', optional: true, hint: 'In SI units: Pa or m3, mol, s.' },
    { kind: 'number', key: 'reactionEntropyJPerMolK', label: 'Reaction entropy', symbol: 'ΔS°', unit: 'J mol-1 K-1', optional: true },
    { ...temperature, optional: true, hint: 'For the rate constants and K.' },
    { kind: 'number', key: 'gasMoleChange', label: 'Change in gas molecules', symbol: 'Δν', optional: true, usual: '0', hint: 'Gas molecules on the right less those on the left.' },
    { kind: 'number', key: 'exponentForward', label: 'Temperature exponent, forward', symbol: 'n', optional: true, usual: '0' },
    referenceTemperature,
    { kind: 'number', key: 'standardPressurePa', label: 'Standard pressure', symbol: 'p°', unit: 'Pa', optional: true, usual: '1e5' },
    {
      kind: 'choice', key: 'basis', label: 'Gas factors are', usual: 'pressure', look: 'segments',
      choices: [{ value: 'pressure', label: 'pressures' }, { value: 'concentration', label: 'concentrations' }],
    },
  ],
  example: { values: { energyForward: '80', reactionEnthalpy: '30', preExponentialForward: '1e13', reactionEntropyJPerMolK: '50', temperatureK: '500' } },
  empty: 'Give the forward activation energy and the reaction enthalpy.',
  outcome: ({ result, input }) => {
    const energy = (value: number | undefined, figure: Figure): Figure[] => (value === undefined ? [] : [{ ...figure, value, energy: true, digits: 5 }]);
    const held = (value: number | null | undefined, ln: number | undefined, figure: Figure): Figure[] => (value === undefined ? [] : [{ ...figure, value, ln: ln ?? null }]);
    const { kForward } = result;
    return {
      main: [
        { label: 'Activation energy, reverse', symbol: 'E_{r}', value: result.energyReverseKJPerMol, energy: true, digits: 5 },
        ...held(result.preExponentialReverse, result.lnPreExponentialReverse, { label: 'Pre-exponential factor, reverse', symbol: 'A_{r}', note: 'in SI units' }),
      ],
      facts: [
        ...held(result.kReverse, result.lnKReverse, { label: `Rate constant, reverse, at ${input.temperatureK ?? ''} K`, symbol: 'k_{r}' }),
        ...(kForward == null ? [] : [{ label: 'Rate constant, forward', symbol: 'k_{f}', value: kForward }]),
        ...held(result.equilibriumConstant, result.lnEquilibriumConstant, { label: 'Equilibrium constant', symbol: 'K' }),
        ...energy(result.gibbsKJPerMol, { label: 'Reaction Gibbs energy', symbol: 'ΔG°' }),
        ...energy(result.localEnergyForwardKJPerMol, { label: 'Local activation energy, forward' }),
        ...energy(result.localEnergyReverseKJPerMol, { label: 'Local activation energy, reverse' }),
        ...(result.exponentReverse === 0 ? [] : [{ label: 'Temperature exponent, reverse', text: String(result.exponentReverse) }]),
      ],
      warnings: result.warnings.map((warning) => warning.message),
    };
  },
  onward: ({ result, input }) => (result.preExponentialReverse == null ? [] : [{
    to: 'arrhenius', label: 'Evaluate the reverse at a temperature',
    values: {
      preExponential: String(result.preExponentialReverse), energy: String(result.energyReverseKJPerMol), exponent: String(result.exponentReverse), referenceTemperatureK: String(input.referenceTemperatureK),
      ...(input.temperatureK === undefined ? {} : { temperatureK: String(input.temperatureK) }),
    },
  }]),
});
