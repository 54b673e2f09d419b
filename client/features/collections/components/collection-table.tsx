import { Link } from 'react-router-dom';
import type { CollectionSummary } from '#shared/contracts/collections.ts';
import { formatDate } from '#client/lib/dates.ts';

/** The reader's collections, the one changed last first. */
export function CollectionTable({ collections }: { collections: readonly CollectionSummary[] }) {
  return (
    <div className="overflow-x-auto">
      <table className="data-table">
        <caption className="sr-only">Your collections</caption>
        <thead><tr><th scope="col">Name</th><th scope="col" className="numeric">Entries</th><th scope="col">Last changed</th></tr></thead>
        <tbody>
          {collections.map((one) => (
            <tr key={one.id}>
              <th scope="row">
                <Link to={`/collections/${one.id}`}>{one.name}</Link>
                {one.description && <p className="text-second font-normal">{one.description}</p>}
              </th>
              <td className="numeric">{one.entries}</td>
              <td>{formatDate(one.changedAt)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
