import type { ReactNode } from 'react';
import type { Bound } from '#shared/domain/kinds.ts';
import { decimalsOf, fixed, setNumber, type SetNumber } from '#client/lib/numbers.ts';
import { Sign } from './signs.tsx';
import { UnitText } from './unit-text.tsx';

export interface ValueProps {
  value: number | null;
  low?: number | null;
  high?: number | null;
  bound?: Bound;
  /** Standard uncertainty in the same unit, or of the natural logarithm with `uScale="ln"`. */
  u?: number | null;
  uScale?: 'linear' | 'ln';
  unit?: string;
  significantDigits?: number | null;
  /** Digits of the uncertainty that are shown. */
  uDigits?: number;
  /** Exactly so many digits where there is no uncertainty, in the place of those printed and a guard digit. */
  digits?: number;
  /** With a power of ten: always, never, or where the number is very large or small. */
  scientific?: boolean | 'auto';
  /** Large, for the head of an entry. */
  large?: boolean;
  /** The words in the place of a value that is not there. */
  absent?: ReactNode;
}

/** Digits, and the power of ten as a true superscript. */
export function NumberText({ number }: { number: SetNumber }) {
  return (
    <span className="number">
      {number.text}
      {number.exponent !== null && <PowerOfTen exponent={number.exponent} />}
    </span>
  );
}

function PowerOfTen({ exponent }: { exponent: number }) {
  return <>{'\u2009×\u200910'}<span className="plain-spelling">^</span><sup>{String(exponent).replace('-', '\u2212')}</sup></>;
}

/** A value set for the page: its parts share one number of decimals and one power of ten. */
interface Setting {
  set: (number: number) => string;
  exponent: number | null;
}

/** How the numbers of a value are set, one way for its value, limits and uncertainty. */
function settingOf({ value, low, high, u, uScale = 'linear', uDigits = 2, digits, significantDigits, scientific = 'auto' }: ValueProps): Setting {
  const central = value ?? high ?? low ?? 0;
  const size = Math.abs(central);
  const linearU = uScale === 'linear' && u ? u : null;
  const power = central !== 0 && (scientific === 'auto' ? size >= 1e5 || size < 1e-3 : scientific);
  const precision = { u: linearU, uDigits, significantDigits: digits ?? significantDigits, guard: digits ? 0 : 1 };
  if (!power) {
    const decimals = decimalsOf(central, precision);
    return { set: (number) => fixed(number, decimals), exponent: null };
  }
  const { exponent } = setNumber(central, { scientific: true, digits: digits ?? (significantDigits ?? 2) + 1 });
  const shift = (number: number) => number / 10 ** (exponent ?? 0);
  const decimals = decimalsOf(shift(central), { ...precision, u: linearU && shift(linearU) });
  return { set: (number) => fixed(shift(number), decimals), exponent };
}

/** A factor by which a value may be off, from the standard uncertainty of its logarithm. */
function factorText(u: number): string {
  return setNumber(Math.exp(u), { digits: 2 }).text;
}

/** A value as text, for labels and copies: "186.2 ± 2.9 kJ/mol", "≥ 152 kJ/mol". */
export function valueText(props: ValueProps): string {
  const { value, low, high, bound = '=', u, uScale = 'linear', unit = '' } = props;
  const { set, exponent } = settingOf(props);
  const power = exponent === null ? '' : ` × 10^${String(exponent).replace('-', '\u2212')}`;
  const tail = `${power}${unit ? ` ${unit}` : ''}`;
  if (bound === 'range' && low != null && high != null) return `${set(low)} to ${set(high)}${tail}`;
  const limit = value ?? high ?? low;
  if (limit == null) return 'not reported';
  const sign = bound === '=' || bound === 'range' ? '' : `${bound} `;
  if (u == null) return `${sign}${set(limit)}${tail}`;
  if (uScale === 'ln') return `${sign}${set(limit)}${power} ×/÷ ${factorText(u)}${unit ? ` ${unit}` : ''}`;
  const pair = `${set(limit)} ± ${set(u)}`;
  return `${sign}${exponent === null ? pair : `(${pair})`}${tail}`;
}

/** A value with its bound, uncertainty and unit. */
export function Value(props: ValueProps) {
  const { value, low, high, bound = '=', u, uScale = 'linear', unit, large = false, absent = 'not reported' } = props;
  const limit = value ?? high ?? low;
  if (limit == null) return <span className="text-second">{absent}</span>;
  const { set, exponent } = settingOf(props);
  const power = exponent === null ? null : <PowerOfTen exponent={exponent} />;
  const range = bound === 'range' && low != null && high != null;
  const pair = !range && u != null && uScale === 'linear';
  return (
    <span className={large ? 'value value-large' : 'value'}>
      {bound !== '=' && bound !== 'range' && <><Sign of={bound} />{' '}</>}
      {pair && power && '('}
      {range
        ? <><b className="value-figure">{set(low)}</b> to <b className="value-figure">{set(high)}</b></>
        : <b className="value-figure">{set(limit)}</b>}
      {pair && <span className="value-rest">{` ±\u2009${set(u)}`}</span>}
      {pair && power && ')'}
      {power && <b className="value-power">{power}</b>}
      {!range && u != null && uScale === 'ln' && <span className="value-rest">{` ×/÷\u2009${factorText(u)}`}</span>}
      {unit && <span className="value-rest">{' '}<UnitText unit={unit} /></span>}
    </span>
  );
}

interface AlignedProps {
  number: SetNumber | null;
  bound?: Bound;
  /** The most decimals that any number of the column has. */
  decimals?: number;
  /** Room for the powers of ten of the column. */
  power?: boolean;
  strong?: boolean;
}

/** A number in a column aligned on the decimal point: what follows the point has the same room in each row. */
export function Aligned({ number, bound = '=', decimals = 0, power = false, strong = false }: AlignedProps) {
  if (!number) return <span className="aligned text-second">not reported</span>;
  const [whole = '', fraction = ''] = number.text.split('.');
  return (
    <span className={`aligned ${strong ? 'font-semibold' : ''}`}>
      {bound !== '=' && bound !== 'range' && <><Sign of={bound} />{' '}</>}
      {whole}
      <span className="aligned-fraction" style={{ minWidth: decimals > 0 ? `calc(${decimals}ch + 0.28em)` : undefined }}>
        {fraction && `.${fraction}`}
      </span>
      {(power || number.exponent !== null) && (
        <span className="aligned-power">
          {number.exponent !== null && <PowerOfTen exponent={number.exponent} />}
        </span>
      )}
    </span>
  );
}

/** The most decimals among the numbers of a column. */
export function mostDecimals(numbers: readonly (SetNumber | null)[]): number {
  return Math.max(0, ...numbers.map((number) => number?.text.split('.')[1]?.length ?? 0));
}

/** A standard uncertainty alone, in a column of its own. */
export function PlusMinus({ u, decimals }: { u: number | null; decimals: number }) {
  if (u === null) return <span className="text-second">not reported</span>;
  return <span className="text-second">{`±\u2009${fixed(u, decimals)}`}</span>;
}
