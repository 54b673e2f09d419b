import { useId, useState, type KeyboardEvent } from 'react';
import { fixed } from '#client/lib/numbers.ts';
import { useWidth } from '#client/lib/use-width.ts';
import { FormulaTspans } from './formula-tspans.tsx';
import { linearScale, type LinearScale } from './linear-scale.ts';
import { PlotLegend } from './plot-legend.tsx';
import { PlotTable } from './plot-table.tsx';
import { highestOf, labelBands, stairs, type LabelBand, type ProfilePathway, type ProfileState } from './profile-layout.ts';
import { SeriesMark, seriesLook } from './series-look.tsx';
import { UnitTspans } from './unit-text.tsx';

interface EnergyProfileProps {
  pathways: readonly ProfilePathway[];
  unit: string;
  /** The kind of energy, as the name of the axis: "Gibbs energy at 700 K". */
  what?: string;
  /** Index of the highest state of the first pathway; found when not given. A pathway may have its own. */
  highest?: number | null;
  /** Decimals of the figures. */
  digits?: number;
  height?: number;
  id?: string;
}

interface Place {
  pathway: number;
  state: number;
}

const pad = { left: 52, right: 14, top: 34 };
const leastSlot = 46;
const labelRow = 17;

/** Energy profiles as stairs: states joined by sills, the highest point of each pathway marked; the names stand in rows beneath. */
export function EnergyProfile({ pathways: given, unit, what = 'Energy', highest, digits = 0, height = 260, id }: EnergyProfileProps) {
  const [frame, available] = useWidth<HTMLDivElement>(720);
  const own = useId();
  const [active, setActive] = useState<Place | null>(null);
  const pathways = given.filter((pathway) => pathway.states.length > 0);
  if (pathways.length === 0) return <p className="text-second">No state to draw yet.</p>;

  const single = pathways.length === 1;
  const count = Math.max(...pathways.map((pathway) => pathway.states.length));
  const width = Math.max(available, pad.left + pad.right + count * leastSlot);
  const slot = (width - pad.left - pad.right) / count;
  const middle = (index: number) => pad.left + slot * (index + 0.5);
  const energies = pathways.flatMap((pathway) => pathway.states.flatMap((state) => [state.energy - (state.u ?? 0), state.energy + (state.u ?? 0)]));
  const bottom = pad.top + height;
  const y = linearScale({ domain: [Math.min(0, ...energies), Math.max(0, ...energies)], range: [bottom - 12, pad.top], nice: 6 });
  const bands = labelBands(pathways, { slot, middle, width });
  const bandRows = bands.reduce((sum, band) => sum + band.levels, 0);
  const total = bottom + 8 + bandRows * labelRow + (bands.length - 1) * 6 + 6;
  const text = (energy: number) => fixed(energy, digits);
  const top = pathways.map((pathway, index) => pathway.highest ?? (index === 0 ? highest : null) ?? highestOf(pathway.states));
  const places = pathways.flatMap((pathway, at) => pathway.states.map((_, state): Place => ({ pathway: at, state })));

  function words({ pathway, state }: Place): string {
    const of = pathways[pathway];
    const one = of?.states[state];
    if (!of || !one) return '';
    return `${single ? '' : `${of.label}: `}${one.label}, ${one.kind === 'transition' ? 'transition state, ' : ''}${text(one.energy)}${one.u ? ` ± ${text(one.u)}` : ''} ${unit}${top[pathway] === state ? ', highest' : ''}`;
  }

  function onKey(event: KeyboardEvent) {
    const at = places.findIndex((place) => place.pathway === active?.pathway && place.state === active.state);
    const moves: Record<string, number> = { ArrowRight: at + 1, ArrowLeft: at < 0 ? 0 : at - 1, Home: 0, End: places.length - 1 };
    const to = moves[event.key];
    if (to !== undefined) {
      event.preventDefault();
      const next = places[Math.max(0, Math.min(places.length - 1, to))] ?? null;
      setActive(next);
      if (next) document.getElementById(`${own}-${next.pathway}-${next.state}`)?.scrollIntoView({ block: 'nearest', inline: 'nearest' });
    } else if (event.key === 'Escape') setActive(null);
  }

  return (
    <figure className="m-0">
      <div className="plot-scroll" ref={frame}>
        <div
          role="listbox" tabIndex={0} onKeyDown={onKey} onBlur={() => setActive(null)}
          aria-label={`${what} of ${single ? pathways[0]?.label : `${pathways.length} pathways`}, state by state, in ${unit}; the figures are in the table below`}
          aria-activedescendant={active ? `${own}-${active.pathway}-${active.state}` : undefined}
        >
          <svg id={id} className="plot" width={width} height={total} viewBox={`0 0 ${width} ${total}`} style={{ maxWidth: 'none' }} role="presentation">
            <ProfileAxis y={y} width={width} bottom={bottom} what={what} unit={unit} />
            {pathways.map((pathway, index) => (
              <Pathway
                key={pathway.id} pathway={pathway} index={index} of={pathways.length} slot={slot} y={y} text={text}
                highest={top[index] ?? 0} active={active?.pathway === index ? active.state : null} faded={active !== null && active.pathway !== index}
                stateId={(state) => `${own}-${index}-${state}`} words={(state) => words({ pathway: index, state })}
                onActive={(state) => setActive(state === null ? null : { pathway: index, state })}
              />
            ))}
            {pathways.map((pathway, index) => {
              // Over all stairs; highest points that several pathways have in one place stand side by side.
              const at = top[index] ?? 0;
              const shared = top.filter((one) => one === at).length > 1;
              const aside = shared ? (index - (pathways.length - 1) / 2) * Math.min(44, (slot - 10) / pathways.length) : 0;
              const state = pathway.states[at];
              return state && <Highest key={pathway.id} energy={text(state.energy)} x={middle(at) + aside} y={y(state.energy + (shared ? 0 : state.u ?? 0))} colour={single ? 'var(--color-ink)' : seriesLook(index).colour} />;
            })}
            <Names bands={bands} pathways={pathways} bottom={bottom} single={single} active={active} />
          </svg>
        </div>
      </div>
      <p className="plot-note no-print min-h-[1.4em]" aria-hidden="true">{active ? words(active) : 'Point at a state, or move with the arrow keys, for its full name.'}</p>
      <PlotLegend
        items={[
          ...(single ? [] : pathways.map((pathway, index) => ({ id: pathway.id, label: pathway.label, sample: <PathwaySample index={index} /> }))),
          { id: 'highest', label: 'highest point', sample: <Pointer x={13} y={10} /> },
          ...(pathways.some((pathway) => pathway.states.some((state) => state.u)) ? [{ id: 'u', label: '± one standard uncertainty', sample: <path d="M10 0h6M13 0v12M10 12h6" stroke="var(--color-ink)" strokeWidth="1" fill="none" /> }] : []),
        ]}
      />
      <PlotTable
        columns={[{ label: 'State' }, ...(single ? [] : [{ label: 'Pathway' }]), { label: 'Kind' }, { label: what, unit, numeric: true }, { label: <>standard<br />uncertainty</>, unit, numeric: true }]}
        rows={places.map((place) => {
          const pathway = pathways[place.pathway] as ProfilePathway;
          const state = pathway.states[place.state] as ProfileState;
          return {
            id: `${place.pathway} ${place.state}`,
            cells: [state.label, ...(single ? [] : [pathway.label]), `${state.kind === 'transition' ? 'transition state' : 'state'}${top[place.pathway] === place.state ? ', highest' : ''}`, text(state.energy), state.u ? text(state.u) : 'not given'],
          };
        })}
      />
    </figure>
  );
}

function ProfileAxis({ y, width, bottom, what, unit }: { y: LinearScale; width: number; bottom: number; what: string; unit: string }) {
  return (
    <g aria-hidden="true">
      <path className="plot-axis" d={`M${pad.left - 5.5} ${pad.top - 8}V${bottom + 0.5}H${width - pad.right}`} />
      <path className="plot-hairline" d={`M${pad.left - 5} ${y(0)}H${width - pad.right}`} />
      {y.ticks(5).map((tick) => (
        <g key={tick}>
          <path className="plot-axis" d={`M${pad.left - 6} ${y(tick)}h-5`} />
          <text x={pad.left - 14} y={y(tick) + 4} textAnchor="end">{y.tickText(tick, 5)}</text>
        </g>
      ))}
      <text x={4} y={14}>{what} / (<UnitTspans unit={unit} />)</text>
    </g>
  );
}

interface PathwayProps {
  pathway: ProfilePathway;
  index: number;
  of: number;
  slot: number;
  y: LinearScale;
  text: (energy: number) => string;
  highest: number;
  active: number | null;
  faded: boolean;
  stateId: (state: number) => string;
  words: (state: number) => string;
  onActive: (state: number | null) => void;
}

/** One pathway: the stairs thin, the tops of the sills strong; several are set off sideways so that their uprights do not cover each other. */
function Pathway({ pathway, index, of, slot, y, text, highest, active, faded, stateId, words, onActive }: PathwayProps) {
  const look = seriesLook(index);
  const colour = of === 1 ? 'var(--color-ink)' : look.colour;
  const shift = (index - (of - 1) / 2) * Math.min(4, slot / (of * 3));
  const edge = (at: number) => pad.left + slot * at + (at === 0 || at === pathway.states.length ? 0 : shift);
  return (
    <g className="profile-pathway" opacity={faded ? 0.3 : 1}>
      <path className="profile-stairs" d={stairs(pathway.states, edge, y)} fill="none" stroke={colour} strokeWidth="1.500" strokeDasharray={of === 1 ? undefined : look.dash} />
      {pathway.states.map((state, at) => {
        const [from, to] = [edge(at), edge(at + 1)];
        const [centre, level] = [(from + to) / 2, y(state.energy)];
        const raised = state.kind === 'transition';
        return (
          <g
            key={at} id={stateId(at)} className="profile-state" role="option" aria-selected={active === at} aria-label={words(at)}
            onPointerEnter={() => onActive(at)} onPointerLeave={() => onActive(null)}
          >
            <rect x={from} y={level - 14} width={to - from} height="28" fill="transparent" />
            {raised && <path className="profile-top" d={`M${from - 0.75} ${level}H${to + 0.75}`} stroke={of === 1 ? 'var(--color-lichen)' : colour} strokeWidth={active === at ? 4.5 : 3} fill="none" />}
            {!raised && active === at && <path d={`M${from} ${level}H${to}`} stroke={colour} strokeWidth="3" fill="none" />}
            {state.u ? <path className="profile-whisker" d={`M${centre - 4} ${y(state.energy + state.u)}h8M${centre} ${y(state.energy + state.u)}V${y(state.energy - state.u)}M${centre - 4} ${y(state.energy - state.u)}h8`} stroke={colour} strokeWidth="1" fill="none" /> : null}
            {of > 1 && raised && <SeriesMark index={index} x={centre} y={level} open={false} colour={colour} size={4} />}
            {of === 1 && at !== highest && <Figure state={state} x={centre} y={y} text={text} />}
          </g>
        );
      })}
    </g>
  );
}

/** The energy of a state, clear of its whisker: over a sill, under a state. */
function Figure({ state, x, y, text }: { state: ProfileState; x: number; y: LinearScale; text: (energy: number) => string }) {
  const u = state.u ?? 0;
  return <text x={x} y={state.kind === 'transition' ? y(state.energy + u) - 7 : y(state.energy - u) + 16} textAnchor="middle">{text(state.energy)}</text>;
}

/** The mark of the highest point of a pathway, with its energy. */
function Highest({ energy, x, y, colour }: { energy: string; x: number; y: number; colour: string }) {
  return (
    <g className="profile-highest" aria-hidden="true">
      <Pointer x={x} y={y - 5} colour={colour} />
      <text className="plot-ink plot-halo" fontWeight={600} x={x} y={y - 18} textAnchor="middle">{energy}</text>
    </g>
  );
}

function Pointer({ x, y, colour = 'var(--color-ink)' }: { x: number; y: number; colour?: string }) {
  return <path d={`M${x - 5} ${y - 8}h10L${x} ${y}Z`} fill={colour} />;
}

function PathwaySample({ index }: { index: number }) {
  const { colour, dash } = seriesLook(index);
  return <><path d="M0 11H7V4H19V11H26" fill="none" stroke={colour} strokeWidth="1.500" strokeDasharray={dash} /><SeriesMark index={index} x={13} y={4} open={false} colour={colour} size={4} /></>;
}

function Names({ bands, pathways, bottom, single, active }: { bands: readonly LabelBand[]; pathways: readonly ProfilePathway[]; bottom: number; single: boolean; active: Place | null }) {
  let from = bottom + 8;
  return bands.map((band) => {
    const start = from;
    from += band.levels * labelRow + 6;
    const index = pathways.findIndex((pathway) => pathway.id === band.pathwayIds[0]);
    return (
      <g key={band.pathwayIds.join(' ')} className="profile-names" aria-hidden="true">
        {bands.length > 1 && !single && <SeriesMark index={index} x={pad.left - 22} y={start + 9} open={false} colour={seriesLook(index).colour} size={4} />}
        {band.labels.map((label) => (
          <g key={label.index}>
            {label.level > 0 && <path className="plot-hairline" d={`M${label.x} ${start - 4}V${start + label.level * labelRow + 3}`} />}
            <text
              className={active?.state === label.index ? 'plot-ink' : undefined} fontWeight={active?.state === label.index ? 600 : undefined}
              x={label.x} y={start + label.level * labelRow + 14} textAnchor="middle"
            >
              <title>{label.full}</title>
              <FormulaTspans text={label.text} />
            </text>
          </g>
        ))}
      </g>
    );
  });
}
