import { useState } from 'react';
import type { EntryFilter } from '#shared/contracts/entry-search.ts';
import { InputField } from '#client/ui/field.tsx';
import { joinWords, type nameParts } from '../filter-words.ts';
import { SentencePanel } from './sentence-panel.tsx';

interface NamesPickerProps {
  part: (typeof nameParts)[number];
  filter: EntryFilter;
  onChange: (change: Partial<EntryFilter>) => void;
}

/** Names in the sentence that are typed, since no list has them all: authors, contributors. */
export function NamesPicker({ part, filter, onChange }: NamesPickerProps) {
  const [typed, setTyped] = useState('');
  const names = filter[part.filter] ?? [];
  return (
    <SentencePanel
      label={part.title} words={names.length > 0 ? joinWords(names, 'or') : null} unset={part.unset}
      onOpen={() => setTyped(names.join(', '))}
      onSet={() => {
        const read = [...new Set(typed.split(/[,;]/).map((name) => name.trim()).filter(Boolean))];
        if (read.some((name) => name.length > 200) || read.length > 50) return 'These are too many or too long names.';
        onChange({ [part.filter]: read.length > 0 ? read : undefined });
        return null;
      }}
      onClear={() => onChange({ [part.filter]: undefined })}
    >
      <InputField label={part.title} hint={part.hint} autoComplete="off" spellCheck={false} data-autofocus value={typed} onChange={(event) => setTyped(event.target.value)} />
    </SentencePanel>
  );
}
