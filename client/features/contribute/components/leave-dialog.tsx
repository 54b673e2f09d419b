import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import type { DraftSaver } from '../draft-saver.ts';
import { useLeaveGuard } from '../use-leave-guard.ts';

/** Asks before a page is left whose draft could not be saved. */
export function LeaveDialog({ saver }: { saver: DraftSaver }) {
  const { asking, leave, stay } = useLeaveGuard(saver);
  return (
    <Dialog
      open={asking}
      title="Leave without saving?"
      onClose={stay}
      actions={<><Button look="primary" onClick={stay}>Stay here</Button><Button onClick={leave}>Leave</Button></>}
    >
      <p>The draft could not be saved just now. What you typed is kept on this device and comes back when you open this form here again.</p>
    </Dialog>
  );
}
