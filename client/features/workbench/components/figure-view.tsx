import { numberFromLn } from '#client/lib/log-number.ts';
import { setNumber } from '#client/lib/numbers.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { Equation } from '#client/ui/equation.tsx';
import { UnitText } from '#client/ui/unit-text.tsx';
import { NumberText, Value } from '#client/ui/value.tsx';
import { isBeyondDouble, valueOf, type Figure } from '../figures.ts';
import { Formula } from '#client/ui/formula.tsx';

/** One figure of a result with its unit and uncertainty; beyond double precision by its logarithm. */
export function FigureView({ figure, large = false }: { figure: Figure; large?: boolean }) {
  const { unit } = useInstrument();
  const note = figure.note && <span className="text-second"> {figure.note}</span>;
  if (figure.equation !== undefined) return <span className={large ? 'figure-equation' : ''}><Equation equation={figure.equation} display={large} />{note}</span>;
  if (figure.text !== undefined) return <span className={large ? 'value value-large' : 'break-words'}>{large ? <b className="value-figure">{figure.text}</b> : figure.text}{note}</span>;
  if (isBeyondDouble(figure)) {
    return (
      <span className={large ? 'value value-large' : 'value'}>
        <b className="value-figure"><NumberText number={numberFromLn(figure.ln, 4)} /></b>
        {figure.unit && <span className="value-rest">{' '}<UnitText unit={figure.unit} /></span>}
        <span className="figure-logarithm">beyond double precision: its natural logarithm is {setNumber(figure.ln, { digits: 8 }).text}</span>
      </span>
    );
  }
  return <><Value {...valueOf(figure, unit)} large={large} absent="not known" />{note}</>;
}

/** The name of a figure with its letter. */
export function FigureName({ figure }: { figure: Figure }) {
  return <>{figure.label}{figure.symbol && <>{' '}<span className="formula-letter"><Formula text={figure.symbol} silent /></span></>}</>;
}
