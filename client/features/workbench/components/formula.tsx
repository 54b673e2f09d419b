import { Fragment, type ReactNode } from 'react';

interface FormulaProps {
  /** `_{}` and `^{}` set indices; without braces the one sign after `_` or `^` is an index. */
  text: string;
  /** In running text only what is in braces is an index. */
  prose?: boolean;
  /** Without the plain spelling, as in the name of a field: it would be read out. */
  silent?: boolean;
}

/** A formula with true indices; a copy has the plain spelling. */
export function Formula({ text, prose = false, silent = false }: FormulaProps) {
  const parts = text.split(prose ? /([_^]\{[^}]*\})/ : /([_^](?:\{[^}]*\}|[^\s{}]))/u);
  return <>{parts.map((part, index) => <Fragment key={index}>{index % 2 === 1 ? setIndex(part, silent) : setMeans(part)}</Fragment>)}</>;
}

/** A letter under a bar: the faces have no such sign, so the bar is drawn. */
function setMeans(text: string): ReactNode {
  return text.split(/(\p{L}\u0304)/u).map((part, index) => (index % 2 === 1 ? <span key={index} className="formula-mean">{part.charAt(0)}</span> : part));
}

function setIndex(part: string, silent: boolean): ReactNode {
  const sign = part.charAt(0);
  const inside = part.slice(1).replace(/^\{|\}$/g, '');
  return <>{!silent && <span className="plain-spelling">{sign}</span>}{sign === '_' ? <sub>{inside}</sub> : <sup>{inside}</sup>}</>;
}
