import { TextButton } from '#client/ui/button.tsx';
import { InputField } from '#client/ui/field.tsx';
import { useEntryField } from '../entry-field.ts';
import { FieldRow } from './form-section.tsx';

/** A citation typed by hand, for a source without a DOI or while its service does not answer. */
export function TypedCitationFields({ onStartOver }: { onStartOver: () => void }) {
  const field = useEntryField();
  return (
    <div className="flex flex-col gap-4" role="group" aria-label="Citation">
      <InputField {...field('source.typed.title')} label="Title" />
      <InputField {...field('source.typed.authors')} label="Authors" hint="Family name, given name; parted by semicolons: Vantongeren, L.; Osei-Brandt, K." />
      <FieldRow>
        <InputField {...field('source.typed.journal')} label="Journal or book" />
        <InputField {...field('source.typed.year')} label="Year" inputMode="numeric" />
        <InputField {...field('source.typed.volume')} label="Volume" />
        <InputField {...field('source.typed.pages')} label="Pages" />
      </FieldRow>
      <InputField {...field('source.typed.doi')} label="DOI, if it has one" typed />
      <div><TextButton onClick={onStartOver}>Look up a DOI, BibTeX or RIS instead</TextButton></div>
    </div>
  );
}
