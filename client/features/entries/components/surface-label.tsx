import { Fragment } from 'react';

/** The name of a surface with true indices: Ru/Al₂O₃, Ni₃Fe(111); a copy has the plain spelling. */
export function SurfaceLabel({ label }: { label: string }) {
  const parts = label.split(/(?<=[A-Z][a-z]?)(\d+)/);
  return <>{parts.map((part, index) => (index % 2 === 1 ? <sub key={index}>{part}</sub> : <Fragment key={index}>{part}</Fragment>))}</>;
}
