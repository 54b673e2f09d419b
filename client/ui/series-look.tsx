const colours = ['var(--color-lichen)', 'var(--color-slate)', 'var(--color-ochre)', 'var(--color-ink)', 'var(--color-rust)', 'var(--color-second)'] as const;
const marks = ['circle', 'square', 'triangle', 'diamond'] as const;

export interface SeriesLook {
  colour: string;
  mark: (typeof marks)[number];
  dash: string | undefined;
}

/** How the series of a plot differ: by mark and dash as well as by hue, so that no two of twelve look alike without colour. */
export function seriesLook(index: number): SeriesLook {
  return {
    colour: colours[index % colours.length] as string,
    mark: marks[index % marks.length] as (typeof marks)[number],
    dash: [undefined, '7 3', '2 3'][Math.floor(index / marks.length) % 3],
  };
}

/** The mark of a series at a point; open when what it marks is extrapolated or computed. */
export function SeriesMark({ index, x, y, open, colour, size = 5 }: {
  index: number; x: number; y: number; open: boolean; colour: string; size?: number;
}) {
  const fill = open ? 'var(--color-paper)' : colour;
  const common = { fill, stroke: colour, strokeWidth: 2 };
  const { mark } = seriesLook(index);
  if (mark === 'square') return <rect x={x - size + 1} y={y - size + 1} width={2 * size - 2} height={2 * size - 2} {...common} />;
  if (mark === 'triangle') return <path d={`M${x} ${y - size}L${x + size} ${y + size - 1}H${x - size}Z`} {...common} />;
  if (mark === 'diamond') return <path d={`M${x} ${y - size - 1}L${x + size} ${y}L${x} ${y + size + 1}L${x - size} ${y}Z`} {...common} />;
  return <circle cx={x} cy={y} r={size} {...common} />;
}
