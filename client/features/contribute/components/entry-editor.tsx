import { useQuery } from '@tanstack/react-query';
import { useEffect, useMemo, useRef, useState } from 'react';
import { FormProvider, get, useForm, useWatch } from 'react-hook-form';
import type { EntryForEditing, EntryInput } from '#shared/contracts/entries.ts';
import { formatDateTime } from '#client/lib/dates.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { useDebounced } from '#client/lib/use-debounced.ts';
import { Button, TextButton } from '#client/ui/button.tsx';
import { TextareaField } from '#client/ui/field.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { PageHead } from '#client/ui/page-head.tsx';
import { previewOptions } from '../api.ts';
import type { HeldDraft } from '../draft-saver.ts';
import { fieldId, FaultsContext, focusField } from '../entry-field.ts';
import { emptyForm, formOf, type EntryForm } from '../entry-form.ts';
import { sourceFaults } from '../faults.ts';
import { readForm } from '../read-form.ts';
import { useDraft, useKeeping } from '../use-draft.ts';
import { useFieldFaults } from '../use-field-faults.ts';
import { useHandingIn } from '../use-handing-in.ts';
import { ConditionsSection } from './conditions-section.tsx';
import { ConflictDialog } from './conflict-dialog.tsx';
import { FaultsList } from './faults-list.tsx';
import { FormSection } from './form-section.tsx';
import { LastDecision } from './last-decision.tsx';
import { LeaveDialog } from './leave-dialog.tsx';
import { LiveResult } from './live-result.tsx';
import { QuantitiesSection } from './quantities-section.tsx';
import { ReportSection } from './report-section.tsx';
import { SaveLine } from './save-line.tsx';
import { SourceSection } from './source-section.tsx';
import { StepSection } from './step-section.tsx';
import { SubmitDialog } from './submit-dialog.tsx';
import { SurfaceSection } from './surface-section.tsx';

interface EntryEditorProps {
  /** The draft to go on with; null for a new one. */
  start: HeldDraft | null;
  /** What a new one comes filled with. */
  prefill?: EntryInput;
  userId: string;
  /** The draft was made on the server. */
  onCreated: (accession: string) => void;
  onSubmitted: (draft: EntryForEditing) => void;
}

/** One form for an entry: what the source prints at the left, what it becomes at the right, saved as it is typed. */
export function EntryEditor({ start, prefill, userId, onCreated, onSubmitted }: EntryEditorProps) {
  const { saver, view, form: initial, restoredFrom } = useDraft(start, userId, prefill);
  const [restored, setRestored] = useState(restoredFrom);
  const [tried, setTried] = useState(false);
  const [later, setLater] = useState(false);
  const summary = useRef<HTMLDivElement>(null);
  const methods = useForm<EntryForm>({ defaultValues: initial });
  const { control, reset, formState: { touchedFields } } = methods;
  const values = useWatch({ control }) as EntryForm;
  const read = useMemo(() => readForm(values), [values]);
  useKeeping(saver, view, values, read.input, userId);

  const { temperatureK } = useInstrument();
  const settled = useDebounced(read.input, 300);
  const empty = Object.keys(settled).length === 0;
  const { data: previewed, error } = useQuery({ ...previewOptions(settled, temperatureK), enabled: !empty });
  const preview = empty ? undefined : previewed;
  const found = useMemo(() => {
    const previewFaults = preview?.faults ?? [];
    // The draft's word on its source counts once it has seen the source that is in the form.
    const draftFaults = view.state.kind === 'unsaved' || view.state.kind === 'saving' ? [] : view.draft?.faults ?? [];
    return [...sourceFaults(read.input.source !== undefined, previewFaults, draftFaults), ...previewFaults];
  }, [preview, view.draft, view.state.kind, read.input.source]);
  const { faults, at } = useFieldFaults(read, found, tried, (path) => Boolean(get(touchedFields, path)));
  const places = useMemo(() => values.quantities.map((_, row) => read.rows.indexOf(row)), [values.quantities, read.rows]);
  const handingIn = useHandingIn(saver, onSubmitted);

  const { accession } = view;
  useEffect(() => {
    if (accession !== null && accession !== start?.draft.accession) onCreated(accession);
    // Told once, when the accession is there.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [accession]);

  function discardRestored() {
    const form = start ? formOf(start.draft.input) : prefill ? formOf(prefill) : emptyForm();
    if (accession === (start?.draft.accession ?? null)) saver.restart(start, start ? readForm(form).input : {});
    reset(form);
    setRestored(null);
  }

  function trySubmitting() {
    if (faults.length > 0 || empty) {
      setTried(true);
      requestAnimationFrame(() => summary.current?.focus());
    } else handingIn.ask();
  }

  const conflict = view.state.kind === 'conflict' ? view.state.theirs : null;
  return (
    <FormProvider {...methods}>
      <FaultsContext value={at}>
        <PageHead
          title={start || accession ? `Draft ${accession ?? ''}` : 'New entry'}
          trail={[{ label: 'My submissions', to: '/contributions' }, { label: start || accession ? 'Draft' : 'New' }]}
          aside={<><SaveLine state={view.state} onRetry={() => void saver.save()} /><Button look="primary" onClick={trySubmitting}>Submit for review</Button></>}
        />
        {view.draft?.lastDecision && <LastDecision decision={view.draft.lastDecision} />}
        {restored && (
          <Notice kind="doubt" live title="Brought back from this device." className="mb-5">
            What was typed until {formatDateTime(restored)} had not reached the server.{' '}
            <TextButton onClick={discardRestored}>Discard it</TextButton>
          </Notice>
        )}
        {conflict && later && (
          <Notice kind="refusal" live title="Saving rests: this draft was changed elsewhere." className="mb-5">
            <TextButton onClick={() => setLater(false)}>Compare the two versions</TextButton>
          </Notice>
        )}
        {tried && faults.length > 0 && (
          <div ref={summary} tabIndex={-1} className="mb-6 outline-none" role="alert">
            <Notice kind="refusal" title={faults.length === 1 ? 'One thing stands in the way of submitting.' : `${faults.length} things stand in the way of submitting.`} />
            <FaultsList faults={faults} />
          </div>
        )}
        <div className="grid gap-x-10 wide:grid-cols-[minmax(0,1fr)_minmax(0,29rem)]">
          <form
            noValidate
            aria-label="Entry"
            onSubmit={(event) => {
              // Enter in a field saves; submitting for review is asked for by its own button.
              event.preventDefault();
              void saver.save();
            }}
          >
            <SourceSection held={view.draft?.source ?? null} accession={accession} />
            <StepSection preview={preview} />
            <SurfaceSection />
            <ReportSection />
            <QuantitiesSection preview={preview} places={places} />
            <ConditionsSection preview={preview} />
            <FormSection title="Note" hint="What a reader has to know and no field above takes; public with the entry.">
              <TextareaField id={fieldId('note')} label="Note" hideLabel rows={3} {...methods.register('note')} error={at('note')} />
            </FormSection>
          </form>
          <aside className="wide:sticky wide:top-4 wide:max-h-[calc(100dvh-2rem)] wide:self-start wide:overflow-y-auto" aria-label="What it becomes" tabIndex={0}>
            <LiveResult preview={preview} error={error} faults={faults} empty={empty} />
          </aside>
        </div>
        <div className="section-line flex flex-wrap items-center gap-5">
          <Button look="primary" onClick={trySubmitting}>Submit for review</Button>
          <SaveLine state={view.state} onRetry={() => void saver.save()} />
        </div>
        <SubmitDialog
          open={handingIn.open} form={values} preview={preview} sourceLabel={view.draft?.source?.label ?? null}
          busy={handingIn.busy} error={handingIn.error} onSubmit={() => void handingIn.submit()} onClose={handingIn.close}
        />
        <ConflictDialog
          open={conflict !== null && !later} mine={read.input} theirs={conflict?.draft.input ?? {}}
          onLater={() => setLater(true)}
          onMine={() => void saver.keepMine()}
          onTheirs={() => {
            if (!conflict) return;
            const theirs = formOf(conflict.draft.input);
            saver.takeTheirs(readForm(theirs).input);
            reset(theirs);
            requestAnimationFrame(() => focusField('source'));
          }}
        />
        <LeaveDialog saver={saver} />
      </FaultsContext>
    </FormProvider>
  );
}
