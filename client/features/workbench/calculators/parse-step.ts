import { parseStepCalculator } from '#shared/calculators/parse-step.ts';
import { sheet } from '../sheet.ts';

export const parseStepSheet = sheet({
  calculator: parseStepCalculator,
  fields: [{ kind: 'text', key: 'text', param: 'equation', label: 'Equation', placeholder: 'NH3* + * -> NH2* + H*', most: 500, wide: true, hint: 'Adsorbed species with an asterisk or (ads), a free site as *, gases plain or with (g).' }],
  example: { values: { equation: 'NH3(ads) + * = NH2(ads) + H(ads)' } },
  empty: 'Give the equation of an elementary step.',
  outcome: ({ result, typed }) => ({
    printed: typed('equation'),
    main: [{ label: 'Read as', equation: result.equation }],
    facts: [
      { label: 'Class', text: result.class.replaceAll('-', ' ') },
      { label: 'Gas order', text: String(result.gasOrder), note: 'gas species on the side typed first' },
      { label: 'Surface order', text: String(result.surfaceOrder), note: 'adsorbed species and free sites on it' },
      { label: 'Direction', text: result.direction === 1 ? 'the same as the key' : 'the reverse of the key' },
      { label: 'Key', text: result.key, note: 'the same for every spelling, isotope and site type' },
      ...(result.variantKey === result.key ? [] : [{ label: 'Key with isotopes and site types', text: result.variantKey }]),
    ],
  }),
});
