import type { Bound } from '#shared/domain/kinds.ts';
import { valueText } from './value.tsx';

interface SillGlyphProps {
  /** Height of the barrier, in any unit that `max` has too; null when there is none to draw. */
  energy: number | null;
  low?: number | null;
  high?: number | null;
  /** Energy of the final state against the initial one, where it is known; drawn quiet at a middle height where not. */
  reactionEnergy?: number | null;
  /** Standard uncertainty, drawn as a whisker. */
  u?: number | null;
  bound?: Bound;
  computed: boolean;
  /** The largest height of the page: all its glyphs have one scale. */
  max: number;
  unit: string;
  /** What is drawn: "Activation energy". */
  what?: string;
  significantDigits?: number | null;
  scale?: number;
}

const width = 64;
const height = 34;
const foot = 28;
const head = 5;
const left = { from: 2, to: 20 };
const right = { from: 42, to: 62 };
const middle = 31;

/**
 * The small drawn barrier of an entry: a step up as high as the energy, to the scale of the page. Dashed when
 * computed, a whisker for the uncertainty, an arrow in the place of the top for a bound.
 */
export function SillGlyph(props: SillGlyphProps) {
  const { energy, low, high, reactionEnergy, u, bound = '=', computed, max, unit, what = 'Barrier', significantDigits, scale = 1 } = props;
  const top = energy ?? (bound === '<' || bound === '≤' ? high : low) ?? high ?? null;
  const label = `${what} ${valueText({ value: energy, low, high, bound, u, unit, significantDigits, uDigits: 1 })}, ${computed ? 'computed' : 'measured'}`;
  if (top === null) return <span className="text-second" role="img" aria-label={`${what} not reported`}>–</span>;

  const span = max > 0 ? max : 1;
  const y = (value: number) => Math.min(height - 1.5, Math.max(2, foot - (value / span) * (foot - head)));
  const yTop = y(top);
  const known = reactionEnergy != null;
  const yEnd = known ? y(reactionEnergy) : foot - (foot - yTop) * 0.35;
  const up = bound === '>' || bound === '≥';
  const down = bound === '<' || bound === '≤';
  const dash = computed ? '2.500 2' : undefined;
  return (
    <svg className="sill-glyph" width={width * scale} height={height * scale} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={label}>
      <g fill="none" strokeWidth="1.500" strokeDasharray={dash}>
        <path d={`M${left.from} ${foot}H${left.to}V${yTop}`} stroke="currentColor" />
        <path d={`M${right.from} ${yTop}V${yEnd}`} stroke="currentColor" />
        <path d={`M${right.from} ${yEnd}H${right.to}`} stroke={known ? 'currentColor' : 'var(--color-edge)'} />
      </g>
      {bound === 'range' && low != null && high != null && (
        <rect x={left.to} y={y(high)} width={right.from - left.to} height={Math.max(1, y(low) - y(high))} fill="var(--color-lichen)" opacity="0.3" />
      )}
      {up || down ? (
        <g fill="none" stroke="var(--color-lichen)" strokeWidth="2">
          <path d={`M${left.to} ${yTop}H${right.from}`} strokeWidth="1" strokeDasharray="2 2" />
          <BoundArrow from={yTop} to={up ? Math.max(1.5, yTop - 9) : Math.min(height - 2, yTop + 9)} />
        </g>
      ) : (
        <path d={`M${left.to - 0.75} ${yTop}H${right.from + 0.75}`} stroke="var(--color-lichen)" strokeWidth="2.600" fill="none" />
      )}
      {u != null && u > 0 && !up && !down && (
        <path
          className="sill-whisker"
          d={`M${middle - 3} ${y(top + u)}H${middle + 3}M${middle} ${y(top + u)}V${y(top - u)}M${middle - 3} ${y(top - u)}H${middle + 3}`}
          stroke="currentColor" strokeWidth="1" fill="none"
        />
      )}
    </svg>
  );
}

/** The arrow of a bound: the value lies there or beyond. */
function BoundArrow({ from, to }: { from: number; to: number }) {
  const tip = to < from ? 3.2 : -3.2;
  return <path d={`M${middle} ${from}V${to}M${middle - 3.2} ${to + tip}L${middle} ${to}L${middle + 3.2} ${to + tip}`} />;
}
