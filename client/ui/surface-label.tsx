import { Fragment } from 'react';

/** The name of a surface with true indices: Ru/Al₂O₃, Ni₃Fe(111); a copy has the plain spelling. */
export function SurfaceLabel({ label }: { label: string }) {
  // Only the material has indices: a facet, a site ("B5") and a size do not.
  const material = /^[^,(]*/.exec(label)?.[0] ?? '';
  const parts = material.split(/(?<=[A-Z][a-z]?)(\d+)/);
  return <>{parts.map((part, index) => (index % 2 === 1 ? <sub key={index}>{part}</sub> : <Fragment key={index}>{part}</Fragment>))}{label.slice(material.length)}</>;
}
