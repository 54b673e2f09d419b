import { Link } from 'react-router-dom';
import type { Entry } from '#shared/contracts/entries.ts';
import { stateWords, type State } from '#shared/domain/states.ts';
import { energyIn, fixed, setNumber } from '#client/lib/numbers.ts';
import { SillGlyph } from '#client/ui/sill-glyph.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { UnitText } from '#client/ui/unit-text.tsx';
import { Aligned, NumberText } from '#client/ui/value.tsx';
import { methodTags, methodText } from '../entry-words.ts';
import { asPrinted, barrierOf, factorOf, rangeText, shown, uncertaintyWords, type RowFigure } from '../row-figures.ts';
import type { RowView } from '../table-rows.ts';

/** The state of an entry that is not accepted; an accepted one needs no word. */
export function StateTag({ state }: { state: State }) {
  return state === 'accepted' ? null : <>{' '}<Tag kind={state === 'retracted' || state === 'rejected' ? 'refusal' : 'doubt'}>{stateWords[state]}</Tag></>;
}

/** The drawn barrier of a row, to the scale of the page. */
export function BarrierCell({ entry, view }: { entry: Entry; view: RowView }) {
  const barrier = barrierOf(entry);
  if (!barrier) return <Absent words="no energy in this entry" />;
  const { value, low, high, u, unit } = shown(barrier, view.unit);
  const reaction = entry.quantities.find((one) => one.symbol === 'reactionEnergy')?.value;
  return (
    <SillGlyph
      energy={value} low={low} high={high} u={u} bound={barrier.bound} unit={unit} significantDigits={barrier.significantDigits}
      reactionEnergy={reaction == null ? null : energyIn(view.unit, reaction)}
      computed={entry.method.class === 'computed'} max={energyIn(view.unit, view.tallestKJPerMol)}
    />
  );
}

/** The converted value, aligned on the decimal point. */
export function ValueCell({ figure, view }: { figure: RowFigure | null; view: RowView }) {
  if (!figure) return <Absent words="not given yet" />;
  const { shown: { quantity, unit }, number, low, high } = figure;
  const tail = view.valueUnit === null && unit && unit !== '1' ? <span className="text-second">{' '}<UnitText unit={unit} /></span> : null;
  if (quantity.bound === 'range' && low && high) {
    return <span className="whitespace-nowrap"><b className="font-semibold"><NumberText number={low} />–<NumberText number={high} /></b>{tail}</span>;
  }
  if (!number) return <span className="text-second">{quantity.missing?.length ? 'not converted' : 'not reported'}</span>;
  return <span className="whitespace-nowrap"><Aligned number={number} bound={quantity.bound} decimals={view.valueDecimals} power={view.valuePower} strong />{tail}</span>;
}

/** The standard uncertainty, or why there is none. */
export function UncertaintyCell({ figure }: { figure: RowFigure | null }) {
  if (!figure) return null;
  const { shown: { quantity, u }, decimals, number } = figure;
  if (u === null) return quantity.bound === '=' || quantity.bound === '≈' ? <>{uncertaintyWords(quantity)}</> : null;
  if (quantity.uncertaintyScale === 'ln') return <>{`×/÷\u2009${setNumber(Math.exp(u), { digits: 2 }).text}`}</>;
  if (number?.exponent != null) return <>±{'\u2009'}<NumberText number={setNumber(u, { scientific: true, digits: 1 })} /></>;
  return <>{`±\u2009${fixed(u, decimals)}`}</>;
}

/** k at the temperature of interest, marked when that lies outside the valid range. */
export function RateCell({ entry, view }: { entry: Entry; view: RowView }) {
  const rate = entry.kAtT;
  if (!rate) return <Absent words="k cannot be calculated: no pre-exponential factor" />;
  return (
    <span className="whitespace-nowrap">
      <NumberText number={setNumber(rate.value, { scientific: true, digits: 2 })} />
      {view.kUnit === null && <span className="text-second">{' '}<UnitText unit={rate.unit} /></span>}
      {rate.uLnK !== null && rate.uLnK > 0 && <span className="text-second" title="one standard uncertainty, as a factor">{` ×/÷\u2009${setNumber(Math.exp(rate.uLnK), { digits: 2 }).text}`}</span>}
      {rate.extrapolated && <>{' '}<Tag kind="doubt">extrapolated</Tag></>}
    </span>
  );
}

/** The pre-exponential factor with its unit where the column has none. */
export function FactorCell({ entry, view }: { entry: Entry; view: RowView }) {
  const factor = factorOf(entry);
  if (!factor) return <Absent words="no pre-exponential factor in this entry" />;
  if (factor.value === null) return <span className="text-second">{factor.missing?.length ? 'not converted' : 'a limit'}</span>;
  return (
    <span className="whitespace-nowrap">
      <NumberText number={setNumber(factor.value, { scientific: true, digits: Math.max(1, Math.min(3, factor.significantDigits ?? 2)) })} />
      {view.factorUnit === null && <span className="text-second">{' '}<UnitText unit={factor.unit} /></span>}
    </span>
  );
}

/** How the value was found, and what sets it apart. */
export function MethodCell({ entry }: { entry: Entry }) {
  return (
    <>
      {methodText(entry)}
      {methodTags(entry).map((tag) => <span key={tag}>{' '}<Tag>{tag}</Tag></span>)}
    </>
  );
}

/** The valid range in kelvin. */
export function RangeCell({ entry }: { entry: Entry }) {
  const text = rangeText(entry.validRange);
  return text ? <span className="whitespace-nowrap">{text}</span> : <Absent words="no valid range stated" />;
}

/** The source, with its notice when it has one. */
export function SourceCell({ entry }: { entry: Entry }) {
  const { source } = entry;
  if (!source) return <Absent words="no source given yet" />;
  return (
    <>
      <Link to={`/sources/${source.id}`}>{source.label}</Link>
      {source.status !== 'current' && <>{' '}<Tag kind={source.status === 'retracted' ? 'refusal' : 'doubt'}>{source.status}</Tag></>}
    </>
  );
}

/** The value exactly as printed. */
export function PrintedText({ figure }: { figure: RowFigure | null }) {
  if (!figure) return null;
  // The note on a column's heading may go to a second line; figure and unit stay together.
  const [value = '', heading] = asPrinted(figure.shown.quantity).split(/ (?=\(× )/);
  return <>{value}{heading && <>{' '}<span className="block">{heading}</span></>}</>;
}

/** A dash that is read as words. */
export function Absent({ words }: { words: string }) {
  return <span className="text-second"><span aria-hidden="true">–</span><span className="sr-only">{words}</span></span>;
}
