import { useState, type FormEvent } from 'react';
import type { ReviewView } from '#shared/contracts/reviews.ts';
import { formatDateTime } from '#client/lib/dates.ts';
import { useLocalStorage } from '#client/lib/local-storage.ts';
import { Button } from '#client/ui/button.tsx';
import { TextareaField } from '#client/ui/field.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { useReviewActions } from '../api.ts';
import { refusalWords } from '../refusals.ts';

/** What was said about the submission; plain text, read by its contributor and by reviewers. */
export function Discussion({ view }: { view: ReviewView }) {
  const { comment } = useReviewActions(view.submission);
  // Kept on this device until it is said, so that a closed window loses nothing.
  const [body, setBody] = useLocalStorage(`sillstone.discussion.${view.submission}`, '');
  const [error, setError] = useState<string>();
  const mayComment = view.actions.includes('comment');

  function say(event: FormEvent) {
    event.preventDefault();
    if (!body.trim()) {
      setError('Write something first.');
      return;
    }
    comment.mutate(body.trim(), { onSuccess: () => setBody('') });
  }

  return (
    <section aria-labelledby="discussion">
      <h2 id="discussion" className="pb-2">Discussion</h2>
      {view.comments.length === 0 && <p className="text-second">Nothing has been said yet.</p>}
      <ol className="flex flex-col gap-3">
        {view.comments.map((one) => (
          <li key={one.id} className="border-l-4 border-hairline pl-3">
            <p className="text-fine text-second"><b>{one.by}</b>, {formatDateTime(one.at)}</p>
            <p className="whitespace-pre-wrap">{one.body}</p>
          </li>
        ))}
      </ol>
      {mayComment && (
        <form className="flex flex-col gap-2 pt-4" noValidate onSubmit={say}>
          <TextareaField
            label="Ask or answer" rows={2} maxLength={4000} value={body} error={error} hint="Kept with the submission for whoever reviews it; it decides nothing."
            onChange={(event) => {
              setBody(event.target.value);
              setError(undefined);
            }}
          />
          {comment.error && <Notice kind="refusal" live title={refusalWords(comment.error).title}>{refusalWords(comment.error).text}</Notice>}
          <div><Button type="submit" small busy={comment.isPending}>Say it</Button></div>
        </form>
      )}
    </section>
  );
}
