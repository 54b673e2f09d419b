import type { ReactNode } from 'react';

export interface LegendItem {
  id: string;
  label: string;
  /** What is drawn in the plot, on a ground of 26 by 12 px whose middle is (13, 6). */
  sample: ReactNode;
}

interface PlotLegendProps {
  items: readonly LegendItem[];
  /** Called while an item is pointed at or has the focus; items can then be reached by the keyboard. */
  onActive?: (id: string | null) => void;
}

/** The key of a plot: what each mark and line stands for. An exported picture takes it along. */
export function PlotLegend({ items, onActive }: PlotLegendProps) {
  const content = (item: LegendItem) => (
    <>
      <svg className="plot-legend-sample" width="26" height="12" aria-hidden="true">{item.sample}</svg>
      <span className="plot-legend-label">{item.label}</span>
    </>
  );
  return (
    <ul className={`plot-legend ${items.length > 12 ? 'plot-legend-long' : ''}`}>
      {items.map((item) => (
        <li key={item.id}>
          {onActive
            ? (
              <button
                type="button" className="plot-legend-item"
                onPointerEnter={() => onActive(item.id)} onPointerLeave={() => onActive(null)}
                onFocus={() => onActive(item.id)} onBlur={() => onActive(null)}
              >
                {content(item)}
              </button>
            )
            : <span className="plot-legend-item">{content(item)}</span>}
        </li>
      ))}
    </ul>
  );
}
