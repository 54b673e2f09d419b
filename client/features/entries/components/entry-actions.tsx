import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useNavigate } from 'react-router-dom';
import { retractEntry, reviseEntry, withdrawEntry, type EntryDetail } from '#shared/contracts/entries.ts';
import { call } from '#client/lib/api-client.ts';
import { announce } from '#client/lib/announce.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { TextareaField } from '#client/ui/field.tsx';
import { EntryLinks } from './source-card.tsx';

/** What the viewer may do with this revision, and what the page adds; nothing where there is nothing. */
export function EntryActions({ entry, children }: { entry: EntryDetail; children?: ReactNode }) {
  const { actions } = entry;
  const any = actions.some((action) => action !== 'export' && action !== 'submit');
  if (!any && !children) return null;
  return (
    <div className="flex flex-wrap gap-3 pb-6 no-print">
      <EntryLinks entry={entry} />
      {actions.includes('revise') && <Revise accession={entry.accession} />}
      {actions.includes('withdraw') && <Withdraw accession={entry.accession} />}
      {actions.includes('retract') && <Retract accession={entry.accession} />}
      {children}
    </div>
  );
}

/** Opens a new draft revision, with the reason, and goes to it. */
function Revise({ accession }: { accession: string }) {
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const navigate = useNavigate();
  const client = useQueryClient();
  const revise = useMutation({
    mutationFn: () => call(reviseEntry, { params: { accession }, body: reason.trim() ? { reason: reason.trim() } : {} }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: ['entries', 'one', accession] });
      void navigate(`/contribute/${accession}`);
    },
  });
  return (
    <>
      <Button onClick={() => setOpen(true)}>Revise</Button>
      <Dialog
        open={open}
        title="Revise this entry"
        onClose={() => setOpen(false)}
        actions={<><Button look="primary" busy={revise.isPending} onClick={() => revise.mutate()}>Open a draft</Button><Button onClick={() => setOpen(false)}>Leave it</Button></>}
      >
        <p className="pb-3">A draft is opened with all that this version says. The accepted version stands until a reviewer accepts the next.</p>
        <TextareaField
          label="Reason" maxLength={1000} value={reason} onChange={(event) => setReason(event.target.value)}
          hint="What is to be corrected; needed when the entry was first contributed by somebody else."
          error={revise.error?.message}
        />
      </Dialog>
    </>
  );
}

/** Takes an open revision back, after a question. */
function Withdraw({ accession }: { accession: string }) {
  const [open, setOpen] = useState(false);
  const client = useQueryClient();
  const navigate = useNavigate();
  const withdraw = useMutation({
    mutationFn: () => call(withdrawEntry, { params: { accession } }),
    onSuccess: async () => {
      setOpen(false);
      announce('Withdrawn.');
      await client.invalidateQueries({ queryKey: ['entries'] });
      void navigate('/contributions');
    },
  });
  return (
    <>
      <Button look="refusal" onClick={() => setOpen(true)}>Withdraw</Button>
      <Dialog
        open={open}
        title="Withdraw this revision"
        onClose={() => setOpen(false)}
        actions={<><Button look="refusal" busy={withdraw.isPending} onClick={() => withdraw.mutate()}>Withdraw</Button><Button onClick={() => setOpen(false)}>Keep it</Button></>}
      >
        <p>It leaves the review queue and is not published. A public version, where there is one, stays as it is.</p>
        {withdraw.isError && <p className="field-error" role="alert">{withdraw.error.message}</p>}
      </Dialog>
    </>
  );
}

/** Takes an accepted version back in public, with a reason everybody reads. */
function Retract({ accession }: { accession: string }) {
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const [missing, setMissing] = useState(false);
  const client = useQueryClient();
  const retract = useMutation({
    mutationFn: () => call(retractEntry, { params: { accession }, body: { reason: reason.trim() } }),
    onSuccess: async () => {
      setOpen(false);
      announce('Retracted.');
      await client.invalidateQueries({ queryKey: ['entries'] });
    },
  });
  const send = () => {
    setMissing(!reason.trim());
    if (reason.trim()) retract.mutate();
  };
  return (
    <>
      <Button look="refusal" onClick={() => setOpen(true)}>Retract</Button>
      <Dialog
        open={open}
        title="Retract this entry"
        onClose={() => setOpen(false)}
        actions={<><Button look="refusal" busy={retract.isPending} onClick={send}>Retract</Button><Button onClick={() => setOpen(false)}>Keep it</Button></>}
      >
        <p className="pb-3">The version stays readable with its notice, and is no longer searched, counted or exported. This cannot be undone; a corrected value is a new version.</p>
        <TextareaField
          label="Public reason" required maxLength={1000} value={reason} onChange={(event) => setReason(event.target.value)}
          error={missing ? 'Say why: everybody who opens the entry reads it.' : retract.error?.message}
        />
      </Dialog>
    </>
  );
}
