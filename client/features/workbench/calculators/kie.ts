import { lazy } from 'react';
import { kieCalculator } from '#shared/calculators/kie.ts';
import type { Figure } from '../figures.ts';
import { sheet, type Field, type NumberField } from '../sheet.ts';
import { temperature } from './common-fields.ts';

const by = (...methods: string[]) => ({ method: methods });
const number = (key: string, label: string, symbol: string, method: string[], more: Partial<NumberField> = {}): Field => ({ kind: 'number', key, label, symbol, only: by(...method), ...more });
const wavenumber = { unit: 'cm-1' };

export const kieSheet = sheet({
  calculator: kieCalculator,
  fields: [
    {
      kind: 'choice', key: 'method', label: 'From', usual: 'arrhenius-pair', look: 'list',
      choices: [
        { value: 'arrhenius-pair', label: 'Arrhenius parameters of both isotopologues' },
        { value: 'two-temperatures', label: 'isotope effects at two temperatures' },
        { value: 'zero-point', label: 'zero-point energies of one stretch', hint: 'The semiclassical limit of a primary effect.' },
        { value: 'bigeleisen-mayer', label: 'harmonic wavenumbers of reactant and transition state' },
        { value: 'tunnelling-ratio', label: 'tunnelling factors of both' },
        { value: 'swain-schaad', label: 'H over D, to H over T' },
        { value: 'swain-schaad-from-dt', label: 'D over T, to H over T' },
      ],
    },
    {
      kind: 'choice', key: 'model', label: 'Tunnelling model', usual: 'wigner', look: 'segments', only: by('tunnelling-ratio'),
      choices: [{ value: 'wigner', label: 'Wigner' }, { value: 'bell-1935', label: 'Bell 1935' }, { value: 'bell-1959', label: 'Bell 1959' }],
    },
    number('preExponentialLight', 'Pre-exponential factor, light', 'A_{L}', ['arrhenius-pair']),
    number('energyLightKJPerMol', 'Activation energy, light', 'E_{L}', ['arrhenius-pair'], { energy: true }),
    number('preExponentialHeavy', 'Pre-exponential factor, heavy', 'A_{H}', ['arrhenius-pair']),
    number('energyHeavyKJPerMol', 'Activation energy, heavy', 'E_{H}', ['arrhenius-pair'], { energy: true }),
    number('temperature1K', 'First temperature', 'T_{1}', ['two-temperatures'], { unit: 'K' }),
    number('kie1', 'Isotope effect there', 'KIE_{1}', ['two-temperatures']),
    number('temperature2K', 'Second temperature', 'T_{2}', ['two-temperatures'], { unit: 'K' }),
    number('kie2', 'Isotope effect there', 'KIE_{2}', ['two-temperatures']),
    number('wavenumberLightPerCm', 'Wavenumber, light', 'ν_{L}', ['zero-point'], wavenumber),
    number('wavenumberHeavyPerCm', 'Wavenumber, heavy', 'ν_{H}', ['zero-point'], wavenumber),
    {
      kind: 'table', key: 'modes', label: 'Harmonic wavenumbers, the real modes', by: 'columns', least: 1, only: by('bigeleisen-mayer'),
      columns: [
        { id: 'reactantLightPerCm', label: 'reactant, light', unit: 'cm-1' }, { id: 'reactantHeavyPerCm', label: 'reactant, heavy', unit: 'cm-1' },
        { id: 'transitionLightPerCm', label: 'transition state, light', unit: 'cm-1' }, { id: 'transitionHeavyPerCm', label: 'transition state, heavy', unit: 'cm-1' },
      ],
    },
    number('imaginaryLightPerCm', 'Imaginary wavenumber, light', 'ν^{‡}_{L}', ['bigeleisen-mayer', 'tunnelling-ratio'], { ...wavenumber, hint: 'Its size, without the i.' }),
    number('imaginaryHeavyPerCm', 'Imaginary wavenumber, heavy', 'ν^{‡}_{H}', ['bigeleisen-mayer', 'tunnelling-ratio'], wavenumber),
    { kind: 'number', key: 'energyLightKJPerMol', label: 'Barrier, light', symbol: 'E_{L}', energy: true, only: { ...by('tunnelling-ratio'), model: ['bell-1935', 'bell-1959'] } },
    { kind: 'number', key: 'energyHeavyKJPerMol', label: 'Barrier, heavy', symbol: 'E_{H}', energy: true, only: { ...by('tunnelling-ratio'), model: ['bell-1935', 'bell-1959'] } },
    { ...temperature, only: by('arrhenius-pair', 'two-temperatures', 'zero-point', 'bigeleisen-mayer', 'tunnelling-ratio') },
    number('kie', 'Isotope effect', 'k_{H}/k_{D}', ['swain-schaad']),
    number('kie', 'Isotope effect', 'k_{D}/k_{T}', ['swain-schaad-from-dt']),
    number('exponent', 'Exponent', 'x', ['swain-schaad'], { optional: true, usual: '1.442' }),
    number('exponent', 'Exponent', 'x', ['swain-schaad-from-dt'], { optional: true, usual: '3.26' }),
  ],
  example: { values: { preExponentialLight: '1e13', energyLight: '80', preExponentialHeavy: '1e13', energyHeavy: '85', temperatureK: '500' } },
  empty: 'Choose what is known and give its figures.',
  outcome: ({ result, input }) => {
    const { factors } = result;
    const some = (value: number | undefined, figure: Figure): Figure[] => (value === undefined ? [] : [{ ...figure, value }]);
    return {
      main: [{ label: 'temperatureK' in input ? `Isotope effect at ${input.temperatureK} K` : 'Isotope effect', symbol: 'kieHD' in result || input.method.startsWith('swain') ? 'k_{H}/k_{T}' : 'k_{L}/k_{H}', value: result.kie }],
      facts: [
        { label: 'Sense', text: result.kie > 1 ? 'normal: the light one reacts faster' : result.kie < 1 ? 'inverse: the heavy one reacts faster' : 'none' },
        { label: 'Natural logarithm', value: result.lnKie, digits: 5 },
        ...some(result.preExponentialRatio, { label: 'Ratio of A', symbol: 'A_{L}/A_{H}' }),
        ...some(result.energyDifferenceKJPerMol, { label: 'Difference of E', symbol: 'E_{H} − E_{L}', energy: true }),
        ...some(result.zeroPointDifferenceKJPerMol, { label: 'Difference of zero-point energies', energy: true }),
        ...(factors ? [
          { label: 'Imaginary ratio', value: factors.imaginaryRatio }, { label: 'Product rule', value: factors.productRule },
          { label: 'Excitation', value: factors.excitation }, { label: 'Zero point', value: factors.zeroPoint },
        ] : []),
        ...some(result.kappaLight, { label: 'Tunnelling factor, light', symbol: 'κ_{L}' }),
        ...some(result.kappaHeavy, { label: 'Tunnelling factor, heavy', symbol: 'κ_{H}' }),
        ...some(result.kieHD, { label: 'Hydrogen over deuterium', symbol: 'k_{H}/k_{D}' }),
        ...some(result.kieDT, { label: 'Deuterium over tritium', symbol: 'k_{D}/k_{T}' }),
      ],
      warnings: result.warnings ?? [],
    };
  },
  onward: ({ result, input }) => (input.method === 'zero-point' || input.method === 'arrhenius-pair'
    ? [{ to: 'kie', label: 'Go from H over D to H over T', values: { method: 'swain-schaad', kie: String(result.kie) } }] : []),
  entry: ({ result, input }) => (input.method === 'arrhenius-pair' || input.method === 'two-temperatures' ? {
    kind: 'kie', provenance: 'derived-from-measured', quantities: [{ symbol: 'kie', asPrinted: result.kie.toPrecision(4), unitAsPrinted: '' }],
    note: input.method === 'arrhenius-pair' ? `Isotope effect at ${input.temperatureK} K from the Arrhenius parameters of both isotopologues.` : `Isotope effect at ${input.temperatureK} K from those at ${input.temperature1K} and ${input.temperature2K} K.`,
  } : null),
  picture: lazy(() => import('../pictures/kie-picture.tsx')),
});
