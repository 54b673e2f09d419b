import { Fragment } from 'react';

/** A barred index, typed with a minus before it: a copy has what is typed. */
function setFacet(facet: string) {
  return facet.split(/(-\d)/).map((part, index) => (
    index % 2 === 1 ? <Fragment key={index}><span className="plain-spelling">-</span><span className="overline">{part.slice(1)}</span></Fragment> : <Fragment key={index}>{part}</Fragment>
  ));
}

/** The name of a surface with true indices and bars: Ru/Al₂O₃, Ni₃Fe(111), Ru(10-10); a copy has the plain spelling. */
export function SurfaceLabel({ label }: { label: string }) {
  // Only the material has indices: a facet, a site ("B5") and a size do not.
  const material = /^[^,(]*/.exec(label)?.[0] ?? '';
  const facet = /^\([-\d\s]+\)/.exec(label.slice(material.length))?.[0] ?? '';
  const parts = material.split(/(?<=[A-Z][a-z]?)(\d+(?:\.\d+)?)/);
  return <>{parts.map((part, index) => (index % 2 === 1 ? <sub key={index}>{part}</sub> : <Fragment key={index}>{part}</Fragment>))}{setFacet(facet)}{label.slice(material.length + facet.length)}</>;
}
