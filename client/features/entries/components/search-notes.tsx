import type { SearchNote } from '#shared/contracts/entry-search.ts';
import { Notice } from '#client/ui/notice.tsx';

interface SearchNotesProps {
  /** Parts of the address that made no sense. */
  ignored: readonly { name: string; message: string }[];
  /** What the server could not read, or read in another way than typed. */
  notes: readonly SearchNote[];
}

/** What of the question could not be read, and what was read in another way than typed. */
export function SearchNotes({ ignored, notes }: SearchNotesProps) {
  const unread = notes.filter(({ found }) => !found);
  const read = notes.filter(({ found }) => found);
  return (
    <>
      {ignored.length > 0 && (
        <Notice kind="doubt" title="Parts of this address could not be read and were left out:" className="mb-5">
          {ignored.map(({ name, message }) => `${name} (${message.replace(/\.$/, '')})`).join(', ')}.
        </Notice>
      )}
      {unread.length > 0 && (
        <Notice kind="doubt" live title="Part of the question finds nothing:" className="mb-5">
          {unread.length === 1 ? unread[0]?.message : <ul>{unread.map(({ filter, value, message }) => <li key={`${filter} ${value}`}>{message}</li>)}</ul>}
        </Notice>
      )}
      {read.length > 0 && <div className="pb-4 text-second" role="status">{read.map(({ filter, value, message }) => <p key={`${filter} ${value}`}>{message}</p>)}</div>}
    </>
  );
}

/** What was looked for in the place of the words as typed. */
export function SpellingLine({ typed, shown, onTake }: { typed: string; shown: string; onTake: (words: string) => void }) {
  return (
    <p className="pb-4" role="status">
      Showing results for <strong>{shown}</strong>. As typed, “{typed}” finds nothing.{' '}
      <button type="button" className="link-button" onClick={() => onTake(shown)}>{`Search for ${shown}`}</button>
    </p>
  );
}
