import { parseValueCalculator } from '#shared/calculators/parse-value.ts';
import { uncertaintyKindWords, uncertaintyKinds } from '#shared/domain/kinds.ts';
import { findEnergyUnit } from '#shared/kinetics/energy.ts';
import { plainNumber, setNumber } from '#client/lib/numbers.ts';
import { sheet } from '../sheet.ts';

const boundWords: Readonly<Record<string, string>> = {
  '=': 'a single value', '≈': 'an approximate value', '<': 'an upper limit, not reached', '≤': 'an upper limit', '>': 'a lower limit, exceeded', '≥': 'a lower limit', range: 'a range',
};
const bounds = ['=', '≈', '<', '≤', '>', '≥', 'range'] as const;

export const parseValueSheet = sheet({
  calculator: parseValueCalculator,
  fields: [
    { kind: 'text', key: 'text', label: 'Value as printed', placeholder: '26.4 ± 1.2', most: 200, wide: true, hint: 'Digits, signs, powers of ten, limits and uncertainties as the source prints them.' },
    { kind: 'text', key: 'unit', param: 'unitAsPrinted', label: 'Unit as printed', optional: true, most: 80, hint: 'Where it stands apart from the value, as in a column heading.', suggestions: ['kJ/mol', 'kcal/mol', 'eV', 's-1', 'cm3 molecule-1 s-1'] },
  ],
  example: { values: { text: '(1.1 ± 0.2) × 10^13', unitAsPrinted: 's-1' } },
  empty: 'Give a value as it is printed.',
  outcome: ({ result, typed }) => {
    const bound = bounds.find((one) => one === result.bound) ?? '=';
    const { value, low, high, unit, standardUncertainty, significantDigits, reportedUncertainty, reportedMinus, reportedPlus } = result;
    const scale = result.uncertaintyScale === 'ln' ? 'ln' : 'linear';
    const kind = uncertaintyKinds.find((one) => one === result.uncertaintyKind);
    const plain = (number: number) => plainNumber(setNumber(number, { digits: 2 }));
    const reported = reportedMinus !== null && reportedPlus !== null ? `+${plain(reportedPlus)} / −${plain(reportedMinus)}` : reportedUncertainty === null ? 'none' : plain(reportedUncertainty);
    const bare = kind === 'unknown' && reported !== 'none';
    return {
      printed: [typed('text'), typed('unitAsPrinted')].filter(Boolean).join(' '),
      main: [{ label: 'Read as', value, low, high, bound, u: standardUncertainty, uScale: scale, unit: unit ?? '', digits: Math.max(1, significantDigits ?? 4) }],
      facts: [
        { label: 'What it is', text: boundWords[result.bound] ?? result.bound },
        { label: 'Reported uncertainty', ...(reportedUncertainty === null ? { text: reported } : { value: reportedUncertainty, unit: scale === 'ln' ? '' : unit ?? '', digits: 2 }), note: scale === 'ln' && reported !== 'none' ? 'of the natural logarithm' : undefined },
        ...(reported === 'none' ? [] : [{ label: 'Its kind', text: kind ? uncertaintyKindWords[kind] : result.uncertaintyKind }]),
        { label: 'Standard uncertainty', ...(standardUncertainty === null ? { text: 'none can be drawn from the print' } : { value: standardUncertainty, unit: scale === 'ln' ? '' : unit ?? '', digits: 2, note: scale === 'ln' ? 'of the natural logarithm' : undefined }) },
        { label: 'Significant digits', text: String(significantDigits ?? 'not known') },
        { label: 'Unit', text: unit ?? 'none printed' },
      ],
      warnings: [
        ...(bare ? ['The print does not say what the uncertainty is: it counts neither as a standard uncertainty nor as zero until the source is found to say.'] : []),
        ...(reportedMinus !== null ? ['The uncertainty is not symmetric: it is kept as printed, and no single standard uncertainty is made of it.'] : []),
      ],
    };
  },
  onward: ({ result }) => {
    const { value, unit, standardUncertainty, uncertaintyScale } = result;
    if (result.uncertaintyKind === 'unknown' && result.reportedUncertainty !== null && uncertaintyScale === 'linear') {
      return [{ to: 'uncertainty', label: 'Say what the ± is', values: { value: String(result.reportedUncertainty), of: unit ?? '' } }];
    }
    if (value === null || !unit) return [];
    const u: Record<string, string> = standardUncertainty !== null && uncertaintyScale === 'linear' ? { standardUncertainty: String(standardUncertainty) } : {};
    const energy = findEnergyUnit(unit);
    if (energy) return [{ to: 'energy', label: 'Convert the energy', values: { value: String(value), from: energy.symbol, ...u } }];
    return /s-1|min-1|h-1/.test(unit) ? [{ to: 'rate-constant', label: 'Convert the rate constant', values: { value: String(value), from: unit, ...u } }] : [];
  },
  entry: ({ result, typed }) => {
    const unit = result.unit ?? typed('unitAsPrinted');
    const quantity = { asPrinted: typed('text').trim(), unitAsPrinted: unit };
    if (unit && findEnergyUnit(unit)) return { kind: 'activation-energy', quantities: [{ symbol: 'energy', energyType: 'arrhenius', ...quantity }], note: '' };
    return /s-1|min-1|h-1/.test(unit) ? { kind: 'rate-constant', quantities: [{ symbol: 'rateConstant', ...quantity }], note: '' } : null;
  },
});

