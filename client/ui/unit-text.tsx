import { Fragment } from 'react';

/** Cuts a unit into bases and exponents, by turns. */
function unitParts(unit: string): string[] {
  return unit.split(/(?<=[A-Za-z\u00b5)])\^?([+\-\u2212]?\d+(?:\.\d+)?)(?=$|[\s/·*)])/);
}

/** A unit as typed by programs ("cm2 molecule-1 s-1", "kJ/mol") with true superscripts; a copy has the plain spelling. */
export function UnitText({ unit }: { unit: string }) {
  return (
    <span className="unit">
      {unitParts(unit).map((part, index) => (index % 2 === 1 ? <sup key={index}>{part.replace('-', '\u2212')}</sup> : <Fragment key={index}>{part}</Fragment>))}
    </span>
  );
}

/** The same inside the text of a drawing. */
export function UnitTspans({ unit }: { unit: string }) {
  return unitParts(unit).map((part, index) => (index % 2 === 1
    ? <Fragment key={index}><tspan dy="-4" fontSize="0.78em">{part.replace('-', '\u2212')}</tspan><tspan dy="4">{'\u200b'}</tspan></Fragment>
    : <tspan key={index}>{part}</tspan>));
}
