import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { energyIn, fixed } from '#client/lib/numbers.ts';
import { useWidth } from '#client/lib/use-width.ts';
import { Link } from 'react-router-dom';
import { linearScale } from './linear-scale.ts';

export interface Neighbour {
  accession: string;
  label: string;
  energyKJPerMol: number;
  computed: boolean;
  sameSurface: boolean;
}

interface NeighbourScaleProps {
  neighbours: readonly Neighbour[];
  /** The value looked at; null while it has none to draw. */
  own: { energyKJPerMol: number; label: string } | null;
  energyUnit: EnergyUnit;
  /** Most neighbours drawn by name; those on the same surface go first. */
  most?: number;
}

const rowHeight = 34;
const margin = 12;

/** Width of a character of the plot's text [px], taken rather too wide than too narrow. */
const characterPx = 6.3;

/** A label over its dot, kept inside the drawing; one that is too long for it loses its end. */
export function placeLabel(label: string, at: number, width: number): { text: string; x: number } {
  const fits = Math.max(8, Math.floor((width - 4) / characterPx));
  const text = label.length > fits ? `${label.slice(0, fits - 1).trimEnd()}…` : label;
  const wide = text.length * characterPx;
  return { text, x: Math.max(2, Math.min(at - wide / 2, width - 2 - wide)) };
}

/** Accepted values for the same step, one under another on one scale, and the one looked at in rust below them. */
export function NeighbourScale({ neighbours, own, energyUnit, most = 10 }: NeighbourScaleProps) {
  const [frame, width] = useWidth<HTMLDivElement>(420);
  if (neighbours.length === 0) {
    return <p className="text-second">No accepted value for this elementary step yet: there is nothing to set it beside.</p>;
  }
  const shown = [...neighbours].sort((a, b) => Number(b.sameSurface) - Number(a.sameSurface)).slice(0, most);
  const rows = [
    ...shown.map((one) => ({ ...one, own: false })),
    ...(own ? [{ accession: '', computed: false, sameSurface: true, ...own, own: true }] : []),
  ];
  const values = rows.map((row) => energyIn(energyUnit, row.energyKJPerMol));
  const x = linearScale({ domain: [Math.min(0, ...values), Math.max(1e-9, ...values)], range: [margin, width - margin], nice: 5 });
  const axisY = rows.length * rowHeight + 10;
  const ticks = x.ticks(Math.max(2, Math.min(5, Math.floor(width / 90))));
  return (
    <figure ref={frame}>
      <svg
        className="plot" width={width} height={axisY + 24} viewBox={`0 0 ${width} ${axisY + 24}`} role="img"
        aria-label={`${shown.length} accepted values for the same step${own ? ` and ${own.label}` : ''} on one scale; the table below has the figures`}
      >
        {rows.map((row, index) => {
          const at = x(values[index] ?? 0);
          const y = index * rowHeight;
          const name = row.own ? row.label : `${row.label}${row.sameSurface ? '' : ', other surface'}`;
          const place = placeLabel(name, at, width);
          return (
            <g key={row.accession || 'own'} aria-hidden="true">
              <text x={place.x} y={y + 12} style={row.own ? { fill: 'var(--color-rust)' } : undefined}>{place.text}</text>
              <circle
                cx={at} cy={y + 23} r={row.own ? 6 : 5}
                style={{
                  fill: row.own ? 'var(--color-rust)' : row.computed ? 'var(--color-paper)' : 'var(--color-lichen)',
                  stroke: row.own ? 'var(--color-rust)' : 'var(--color-lichen)', strokeWidth: 1.8,
                }}
              />
            </g>
          );
        })}
        <path className="plot-axis" d={`M0 ${axisY + 0.5}H${width}`} />
        {ticks.map((tick, index) => (
          <g key={tick}>
            <path className="plot-axis" d={`M${Math.round(x(tick)) + 0.5} ${axisY}v5`} />
            <text
              x={index === ticks.length - 1 ? Math.min(width - 2, x(tick) + 30) : x(tick)} y={axisY + 19}
              textAnchor={index === 0 ? 'start' : index === ticks.length - 1 ? 'end' : 'middle'} dx={index === 0 ? -4 : 0}
            >
              {String(tick).replace('-', '\u2212')}{index === ticks.length - 1 ? ` ${energyUnit}` : ''}
            </text>
          </g>
        ))}
      </svg>
      <p className="pt-1 text-fine text-second">{!own && 'Energies for the same elementary step; this value is of another kind. '}Filled is measured, open is computed{neighbours.length > shown.length && `; ${shown.length} of ${neighbours.length} are drawn`}.</p>
      <details className="plot-table">
        <summary>The same as a table</summary>
        <table className="mt-2 w-full">
          <thead>
            <tr className="border-b border-rule text-left">
              <th scope="col" className="py-1 font-semibold">Entry</th>
              <th scope="col" className="py-1 font-semibold">Method</th>
              <th scope="col" className="py-1 text-right font-semibold">{energyUnit}</th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => (
              <tr key={row.accession || 'own'} className="border-b border-hairline">
                <th scope="row" className="py-1 pr-3 text-left font-normal">{row.own ? row.label : <Link to={`/entries/${row.accession}`}>{row.label}</Link>}</th>
                <td className="py-1 pr-3">{row.own ? 'this one' : row.computed ? 'computed' : 'measured'}</td>
                <td className="py-1 text-right">{fixed(values[index] ?? 0, energyUnit === 'eV' ? 2 : 1)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </details>
    </figure>
  );
}
