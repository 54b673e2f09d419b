import { isApiError } from '#client/lib/api-error.ts';
import { TextButton } from '#client/ui/button.tsx';
import type { SaveState } from '../draft-saver.ts';

const two = (n: number) => String(n).padStart(2, '0');

/** How far the draft is kept: "Saved 14:05". */
export function SaveLine({ state, onRetry }: { state: SaveState; onRetry: () => void }) {
  return (
    <p role="status" className="text-second">
      {state.kind === 'nothing' && 'The draft saves itself as you type.'}
      {state.kind === 'unsaved' && 'Not saved yet'}
      {state.kind === 'saving' && 'Saving'}
      {state.kind === 'saved' && `Saved ${two(state.at.getHours())}:${two(state.at.getMinutes())}`}
      {state.kind === 'conflict' && <span className="text-rust">Not saved: this draft was changed elsewhere</span>}
      {state.kind === 'failed' && (
        <span className="text-rust">
          Not saved, kept on this device. {isApiError(state.error) ? `${state.error.title}. ` : ''}
          <TextButton onClick={onRetry}>Save again</TextButton>
        </span>
      )}
    </p>
  );
}
