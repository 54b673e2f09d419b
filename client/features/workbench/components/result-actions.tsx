import { fileNameOf, saveFile } from '#client/lib/save-file.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { Button, LinkButton } from '#client/ui/button.tsx';
import type { Answer } from '../answer.ts';
import { reportCsv, reportText } from '../report.ts';
import type { Sheet } from '../sheet.ts';
import type { Typed } from '../typed.ts';
import { CopyButton } from './copy-button.tsx';

interface ResultActionsProps {
  sheet: Sheet;
  typed: Typed;
  answer: Extract<Answer, { state: 'result' }>;
  /** The address of the calculation; empty where it is too long to be one. */
  link: string;
  /** Whether who is signed in may start an entry. */
  mayContribute: boolean;
}

/** Most characters that the note of an entry is given. */
const longestNote = 3900;

/** How the figures came about, with the address of the calculation where there is room for it; nothing for a value as printed. */
function noteOf(note: string, link: string): string | undefined {
  const whole = `${note} Calculation: ${link}`;
  return note === '' ? undefined : link && whole.length <= longestNote ? whole : note;
}

/** What can be done with a result: copy, save, start an entry. */
export function ResultActions({ sheet, typed, answer, link, mayContribute }: ResultActionsProps) {
  const { unit: energyUnit } = useInstrument();
  const { entry } = answer;
  return (
    <div className="result-actions no-print">
      <CopyButton label="Copy as text" copied="Text copied" text={() => reportText(sheet, typed, answer, { energyUnit, link })} />
      <CopyButton label="Copy as CSV" copied="CSV copied" text={() => reportCsv(sheet, typed, answer)} />
      <Button small onClick={() => saveFile(`${fileNameOf(sheet.calculator.title)}.csv`, reportCsv(sheet, typed, answer), 'text/csv')}>Save CSV</Button>
      {mayContribute && entry && (
        <LinkButton small to="/contribute" state={{ prefill: { ...entry, note: noteOf(entry.note, link) } }}>Use in a new entry</LinkButton>
      )}
    </div>
  );
}
