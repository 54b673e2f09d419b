import type { ReactNode } from 'react';

/** The bar at the foot while rows are chosen: how many, and what can be done with them. */
export function Tray({ count, what = 'entries', one = 'entry', onClear, children }: {
  count: number; what?: string; one?: string; onClear: () => void; children: ReactNode;
}) {
  if (count === 0) return null;
  return (
    <section className="tray" aria-label="Chosen rows">
      <div className="page tray-row">
        <strong>{`${count} ${count === 1 ? one : what} chosen`}</strong>
        {children}
        <button type="button" className="button button-quiet ml-auto" onClick={onClear}>Clear</button>
      </div>
    </section>
  );
}
