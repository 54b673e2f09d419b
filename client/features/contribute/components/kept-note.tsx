import { useFormContext, useWatch } from 'react-hook-form';
import { TextButton } from '#client/ui/button.tsx';
import type { EntryForm } from '../entry-form.ts';

/** `nearestNeighbours` as people say it: "nearest neighbours". */
const words = (name: string) => name.replace(/([A-Z])/g, (letter) => ` ${letter.toLowerCase()}`);

/** What the entry says that the form has no field for: kept as it is, unless it is dropped here. */
export function KeptNote({ part }: { part: keyof EntryForm['kept'] }) {
  const { setValue } = useFormContext<EntryForm>();
  const kept = useWatch<EntryForm, 'kept'>({ name: 'kept' })[part];
  const members = Object.entries(kept);
  if (members.length === 0) return null;
  return (
    <p className="text-second">
      {`This entry also says: ${members.map(([name, value]) => (value === true ? words(name) : `${words(name)} ${String(value)}`)).join(', ')}. It is kept as it is.`}{' '}
      <TextButton onClick={() => setValue(`kept.${part}`, {}, { shouldDirty: true })}>Drop it</TextButton>
    </p>
  );
}
