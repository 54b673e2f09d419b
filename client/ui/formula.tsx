import { Fragment, type ReactNode } from 'react';

interface FormulaProps {
  /** `_{}` and `^{}` set indices; without braces the one sign after `_` or `^` is an index. */
  text: string;
  /** In running text only what is in braces is an index. */
  prose?: boolean;
  /** In the line of a derivation, written for programs too, the whole word after the sign is an index: `k_B T`, `(RT)^2`. */
  line?: boolean;
  /** Without the plain spelling, as in the name of a field: it would be read out. */
  silent?: boolean;
}

/** A formula with true indices; a copy has the plain spelling. */
export function Formula({ text, prose = false, line = false, silent = false }: FormulaProps) {
  const parts = text.split(prose ? inBraces : line ? wholeWord : oneSign);
  return <>{parts.map((part, index) => <Fragment key={index}>{index % 2 === 1 ? setIndex(part, silent) : setMeans(part)}</Fragment>)}</>;
}

const inBraces = /([_^]\{[^}]*\})/;
const oneSign = /([_^](?:\{[^}]*\}|[^\s{}]))/u;
const wholeWord = /(?<=[\p{L}\p{N}°‡)])([_^](?:\{[^}]*\}|[-+\u2212]?[\p{L}\p{N}.]*[\p{L}\p{N}]))/u;

/** A letter under a bar: the faces have no such sign, so the bar is drawn. */
function setMeans(text: string): ReactNode {
  return text.split(/(\p{L}\u0304)/u).map((part, index) => (index % 2 === 1 ? <span key={index} className="formula-mean">{part.charAt(0)}</span> : part));
}

function setIndex(part: string, silent: boolean): ReactNode {
  const sign = part.charAt(0);
  const inside = part.slice(1).replace(/^\{|\}$/g, '');
  return <>{!silent && <span className="plain-spelling">{sign}</span>}{sign === '_' ? <sub>{inside}</sub> : <sup>{inside}</sup>}</>;
}
