import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useLocation, useNavigate, useParams } from 'react-router-dom';
import { entryInput, type EntryInput } from '#shared/contracts/entries.ts';
import { announce } from '#client/lib/announce.ts';
import { DraftGate } from '#client/features/contribute/components/draft-gate.tsx';
import { EntryEditor } from '#client/features/contribute/components/entry-editor.tsx';
import { RequireRole } from '#client/routes/sign-in/require-role.tsx';

/** Which form is open: a new one by its number, the accession it was given once it was saved, and the address last seen. */
interface Seat {
  number: number;
  made: string | null;
  seen: string | null;
}

/** What another page hands over for a new entry: kind, quantities, note. What is no input of an entry is as nothing. */
function prefillOf(state: unknown): EntryInput | undefined {
  const read = entryInput.safeParse((state as { prefill?: unknown } | null)?.prefill);
  return read.success ? read.data : undefined;
}

/** Contribute: a new entry, or a draft to go on with. */
export function Component() {
  const { accession = null } = useParams();
  const navigate = useNavigate();
  const prefill = prefillOf(useLocation().state);
  const client = useQueryClient();
  const [seat, setSeat] = useState<Seat>({ number: 0, made: null, seen: accession });
  // From a saved form back to "/contribute": that asks for an empty one.
  if (accession !== seat.seen) setSeat(accession === null ? { number: seat.number + 1, made: null, seen: null } : { ...seat, seen: accession });

  return (
    <RequireRole role="contributor" title="Contribute">
      {(user) => {
        const editor = {
          userId: user.id,
          onSubmitted: ({ accession: submitted }: { accession: string }) => {
            void client.invalidateQueries({ queryKey: ['my-entries'] });
            void client.invalidateQueries({ queryKey: ['session'] });
            announce(`Entry ${submitted} is submitted for review`);
            void navigate('/contributions', { state: { submitted } });
          },
          onCreated: (made: string) => {
            setSeat((before) => ({ ...before, made }));
            void navigate(`/contribute/${made}`, { replace: true, preventScrollReset: true });
          },
        };
        if (accession === null || accession === seat.made) return <EntryEditor key={`new-${seat.number}`} start={null} prefill={prefill} {...editor} />;
        return <DraftGate key={accession} accession={accession}>{(held) => <EntryEditor start={held} {...editor} />}</DraftGate>;
      }}
    </RequireRole>
  );
}
