import type { ReviewView } from '#shared/contracts/reviews.ts';
import { formatDate } from '#client/lib/dates.ts';

const done: Readonly<Record<string, string>> = { accept: 'accepted', return: 'returned', reject: 'rejected' };

/** What was decided on this entry before. */
export function EarlierRounds({ earlier }: Pick<ReviewView, 'earlier'>) {
  if (earlier.length === 0) return null;
  return (
    <section aria-labelledby="earlier">
      <h2 id="earlier" className="pb-2">Earlier rounds</h2>
      <ol className="flex flex-col gap-3">
        {earlier.map((one) => (
          <li key={one.round} className="border-l-4 border-ochre pl-3">
            <p className="text-fine text-second">Round {one.round}, {done[one.decision] ?? one.decision} by {one.by}, {formatDate(one.at)}</p>
            <p className="whitespace-pre-wrap">{one.comment || 'No comment.'}</p>
          </li>
        ))}
      </ol>
    </section>
  );
}

/** What differs from the version before, as printed. */
export function Changes({ changes }: Pick<ReviewView, 'changes'>) {
  if (changes.length === 0) return null;
  return (
    <section aria-labelledby="changes">
      <h2 id="changes" className="pb-2">Changed since the version before</h2>
      <table className="w-full">
        <thead>
          <tr className="border-b border-ink text-left text-fine">
            <th scope="col" className="py-1 pr-3 font-semibold">Part</th>
            <th scope="col" className="py-1 pr-3 font-semibold">Before</th>
            <th scope="col" className="py-1 font-semibold">Now</th>
          </tr>
        </thead>
        <tbody>
          {changes.map((change) => (
            <tr key={change.field} className="border-b border-hairline align-top">
              <th scope="row" className="py-1.5 pr-3 text-left font-semibold">{change.field}</th>
              <td className="py-1.5 pr-3 text-second break-words"><del className="decoration-second">{change.before}</del></td>
              <td className="py-1.5 break-words"><ins className="no-underline">{change.after}</ins></td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
