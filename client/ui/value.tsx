import type { ReactNode } from 'react';
import type { Bound } from '#shared/domain/kinds.ts';
import { decimalsOf, fixed, plainNumber, setNumber, type SetNumber } from '#client/lib/numbers.ts';
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
      {number.exponent !== null && (
        <>
          {'\u2009×\u200910'}
          <span className="plain-spelling">^</span>
          <sup>{String(number.exponent).replace('-', '\u2212')}</sup>
        </>
      )}
    </span>
  );
}

/** How the numbers of a value are set, one way for its value, limits and uncertainty. */
function setterFor({ value, low, high, u, uScale = 'linear', uDigits, significantDigits, scientific = 'auto' }: ValueProps) {
  const central = value ?? high ?? low ?? 0;
  const linearU = uScale === 'linear' ? u : null;
  const size = Math.abs(central);
  const power = scientific === 'auto' ? size !== 0 && (size >= 1e5 || size < 1e-3) : scientific;
  if (power) {
    const exponent = size === 0 ? 0 : Math.floor(Math.log10(size));
    const digits = linearU ? Math.max(1, exponent - Math.floor(Math.log10(linearU)) + (uDigits ?? 2)) : significantDigits ?? 3;
    return { set: (number: number) => setNumber(number, { scientific: true, digits: Math.min(8, digits) }), exponent };
  }
  const decimals = decimalsOf(central, { u: linearU, uDigits, significantDigits });
  return { set: (number: number) => setNumber(number, { scientific: false, decimals }), exponent: null };
}

/** A value as text, for labels and copies: "186.2 ± 2.9 kJ/mol", "≥ 152 kJ/mol". */
export function valueText(props: ValueProps): string {
  const { value, low, high, bound = '=', u, uScale = 'linear', unit = '' } = props;
  const { set } = setterFor(props);
  const tail = unit ? ` ${unit}` : '';
  if (bound === 'range' && low != null && high != null) return `${plainNumber(set(low))} to ${plainNumber(set(high))}${tail}`;
  const limit = value ?? high ?? low;
  if (limit == null) return 'not reported';
  const sign = bound === '=' || bound === 'range' ? '' : `${bound} `;
  const spread = u == null ? '' : uScale === 'ln' ? ` ×/÷ ${setNumber(Math.exp(u), { digits: 2 }).text}` : ` ± ${plainNumber(set(u))}`;
  return `${sign}${plainNumber(set(limit))}${spread}${tail}`;
}

/** A value with its bound, uncertainty and unit. */
export function Value(props: ValueProps) {
  const { value, low, high, bound = '=', u, uScale = 'linear', unit, large = false, absent = 'not reported' } = props;
  const { set, exponent } = setterFor(props);
  const unitPart = unit ? <>{' '}<UnitText unit={unit} /></> : null;
  const limit = value ?? high ?? low;
  if (limit == null) return <span className="text-second">{absent}</span>;
  const size = large ? 'value value-large' : 'value';
  if (bound === 'range' && low != null && high != null) {
    return (
      <span className={size}>
        <b className="value-figure"><NumberText number={set(low)} /></b> to <b className="value-figure"><NumberText number={set(high)} /></b>
        <span className="value-rest">{unitPart}</span>
      </span>
    );
  }
  return (
    <span className={size}>
      {bound !== '=' && bound !== 'range' && <><Sign of={bound} />{' '}</>}
      <b className="value-figure"><NumberText number={set(limit)} /></b>
      <span className="value-rest">
        {u != null && (uScale === 'ln'
          ? <>{' ×/÷\u2009'}{setNumber(Math.exp(u), { digits: 2 }).text}</>
          : <>{' ±\u2009'}<NumberText number={exponent === null ? set(u) : setNumber(u, { scientific: true, digits: props.uDigits ?? 2 })} /></>)}
        {unitPart}
      </span>
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
          {number.exponent !== null && (
            <>{'\u2009×\u200910'}<span className="plain-spelling">^</span><sup>{String(number.exponent).replace('-', '\u2212')}</sup></>
          )}
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
