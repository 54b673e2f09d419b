import type { EntryInput } from '#shared/contracts/entries.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { differingParts } from '../input-parts.ts';

interface ConflictDialogProps {
  open: boolean;
  mine: EntryInput;
  theirs: EntryInput;
  onTheirs: () => void;
  onMine: () => void;
  onLater: () => void;
}

/** The draft was changed in another window: shows what differs and asks which version goes on. */
export function ConflictDialog({ open, mine, theirs, onTheirs, onMine, onLater }: ConflictDialogProps) {
  const parts = open ? differingParts(mine, theirs) : [];
  return (
    <Dialog
      open={open}
      title="This draft was changed elsewhere"
      onClose={onLater}
      actions={(
        <>
          <Button look="primary" onClick={onMine}>Keep mine over it</Button>
          <Button onClick={onTheirs}>Take theirs</Button>
          <Button look="quiet" onClick={onLater}>Decide later</Button>
        </>
      )}
    >
      <p>Another window, or another device, saved it since you opened it here. Nothing of yours was saved over it; until you choose, saving rests.</p>
      {parts.length === 0 ? <p className="pt-3">The two versions say the same.</p> : (
        <table className="mt-4 w-full text-fine">
          <thead>
            <tr className="border-b border-ink text-left">
              <th scope="col" className="py-1 pr-3 font-semibold">Part</th>
              <th scope="col" className="py-1 pr-3 font-semibold">Mine, here</th>
              <th scope="col" className="py-1 font-semibold">Theirs, saved</th>
            </tr>
          </thead>
          <tbody>
            {parts.map((part) => (
              <tr key={part.name} className="border-b border-hairline align-top">
                <th scope="row" className="py-1 pr-3 text-left font-semibold">{part.name}</th>
                <td className="py-1 pr-3 break-words">{part.mine}</td>
                <td className="py-1 break-words">{part.theirs}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </Dialog>
  );
}
