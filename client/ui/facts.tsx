import type { ReactNode } from 'react';

/** Pairs of a name and what is known: conditions, a surface, a submission. What is not known is written out. */
export function Facts({ facts }: { facts: readonly { name: ReactNode; value: ReactNode; key?: string }[] }) {
  return (
    <dl className="facts">
      {facts.map((fact, index) => (
        <div className="facts-pair" key={fact.key ?? index}>
          <dt>{fact.name}</dt>
          <dd>{fact.value ?? <span className="text-second">not reported</span>}</dd>
        </div>
      ))}
    </dl>
  );
}
