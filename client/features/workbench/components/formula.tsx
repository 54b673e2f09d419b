import { Fragment, type ReactNode } from 'react';

interface FormulaProps {
  /** `_{}` and `^{}` set indices; without braces the one sign after `_` or `^` is an index. */
  text: string;
  /** In running text only what is in braces is an index. */
  prose?: boolean;
}

/** A formula with true indices; a copy has the plain spelling. */
export function Formula({ text, prose = false }: FormulaProps) {
  const parts = text.split(prose ? /([_^]\{[^}]*\})/ : /([_^](?:\{[^}]*\}|[^\s{}]))/u);
  return <>{parts.map((part, index) => <Fragment key={index}>{index % 2 === 1 ? setIndex(part) : part}</Fragment>)}</>;
}

function setIndex(part: string): ReactNode {
  const sign = part.charAt(0);
  const inside = part.slice(1).replace(/^\{|\}$/g, '');
  return <><span className="plain-spelling">{sign}</span>{sign === '_' ? <sub>{inside}</sub> : <sup>{inside}</sup>}</>;
}
