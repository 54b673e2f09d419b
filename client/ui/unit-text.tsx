import { Fragment } from 'react';

/** A unit as typed by programs ("cm2 molecule-1 s-1", "kJ/mol") with true superscripts; a copy has the plain spelling. */
export function UnitText({ unit }: { unit: string }) {
  const parts = unit.split(/(?<=[A-Za-z\u00b5)])\^?([+\-\u2212]?\d+(?:\.\d+)?)(?=$|[\s/·*)])/);
  return (
    <span className="unit">
      {parts.map((part, index) => (index % 2 === 1 ? <sup key={index}>{part.replace('-', '\u2212')}</sup> : <Fragment key={index}>{part}</Fragment>))}
    </span>
  );
}
