import { useRef, useState, type ClipboardEvent, type KeyboardEvent } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import type { SourceSummary } from '#shared/contracts/sources.ts';
import { Button, TextButton } from '#client/ui/button.tsx';
import { InputField, TextareaField } from '#client/ui/field.tsx';
import { fieldId, useEntryField, useFaultAt } from '../entry-field.ts';
import { emptyForm, type EntryForm } from '../entry-form.ts';
import { readSource } from '../read-source.ts';
import { FoundByDoi } from './found-by-doi.tsx';
import { FoundCitation, HeldSource } from './found-citation.tsx';
import { FormSection } from './form-section.tsx';
import { TypedCitationFields } from './typed-citation-fields.tsx';

interface SourceSectionProps {
  /** The source as the server holds it for this draft. */
  held: SourceSummary | null;
  /** This draft, which is not one of the entries that are already there. */
  accession: string | null;
}

/** The source first: one box takes a DOI, BibTeX or RIS; without them the citation is typed. Then the place in the source. */
export function SourceSection({ held, accession }: SourceSectionProps) {
  const field = useEntryField();
  const { setValue } = useFormContext<EntryForm>();
  const source = useWatch<EntryForm, 'source'>({ name: 'source' });

  function choose(next: Partial<EntryForm['source']>) {
    setValue('source', { ...emptyForm().source, ...next }, { shouldDirty: true });
  }
  const typeInstead = (doi = '') => choose({ via: 'typed', typed: { ...source.typed, doi: source.typed.doi || doi } });
  const startOver = () => {
    choose({});
    requestAnimationFrame(() => document.getElementById(fieldId('source.box'))?.focus());
  };

  return (
    <FormSection title="Source" hint="First of all: what is already entered from it is shown at once.">
      {source.via === '' && <SourceBox onRead={choose} onType={() => typeInstead()} />}
      {source.via === 'doi' && (
        <FoundByDoi doi={source.doi} accession={accession} onType={() => typeInstead(source.doi)} onStartOver={startOver} />
      )}
      {(source.via === 'bibtex' || source.via === 'ris') && <FoundCitation via={source.via} text={source.text} onStartOver={startOver} />}
      {source.via === 'id' && <HeldSource held={held} accession={accession} doi={source.doi || held?.doi || ''} onStartOver={startOver} />}
      {source.via === 'typed' && <TypedCitationFields onStartOver={startOver} />}
      <InputField {...field('locator')} label="Where in the source" hint="Page, table, figure or equation: Table 2, page 113" />
    </FormSection>
  );
}

interface SourceBoxProps {
  onRead: (source: Partial<EntryForm['source']>) => void;
  onType: () => void;
}

function SourceBox({ onRead, onType }: SourceBoxProps) {
  const faultAt = useFaultAt();
  const [typed, setTyped] = useState('');
  const [message, setMessage] = useState<string>();
  const box = useRef<HTMLTextAreaElement>(null);

  function look(text: string) {
    const read = readSource(text);
    if (read.form === 'doi') onRead({ via: 'doi', doi: read.doi });
    else if (read.form === 'bibtex' || read.form === 'ris') onRead({ via: read.form, text: read.text });
    else {
      setMessage(read.form === 'unknown' ? read.message : 'Paste or type a DOI, a BibTeX entry or a RIS record first.');
      box.current?.focus();
    }
  }

  function onPaste(event: ClipboardEvent) {
    const pasted = event.clipboardData.getData('text');
    // A whole citation or DOI pasted into the empty box needs no further press.
    if (typed.trim() || readSource(pasted).form === 'unknown') return;
    event.preventDefault();
    setTyped(pasted);
    look(pasted);
  }

  function onKey(event: KeyboardEvent) {
    if (event.key !== 'Enter' || event.shiftKey || readSource(typed).form !== 'doi') return;
    event.preventDefault();
    look(typed);
  }

  return (
    <div className="flex flex-col gap-3">
      <TextareaField
        ref={box} id={fieldId('source.box')} label="DOI, BibTeX or RIS" typed rows={2} value={typed}
        hint="In any form: 10.5555/…, doi:10.5555/…, an address, @article{…}, TY  - JOUR"
        error={message ?? faultAt('source')}
        onChange={(event) => {
          setTyped(event.target.value);
          setMessage(undefined);
        }}
        onPaste={onPaste} onKeyDown={onKey}
      />
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
        <Button onClick={() => look(typed)}>Look up</Button>
        <TextButton onClick={onType}>Type the citation instead</TextButton>
      </div>
    </div>
  );
}
