import { useMemo } from 'react';
import { defaultPreferences, type Preferences } from '#shared/contracts/accounts.ts';
import { sortKeys, type EntryFilter, type SortKey } from '#shared/contracts/entry-search.ts';
import { useLocalStorage } from '#client/lib/local-storage.ts';
import { columnsKey, rowsKey, usualColumns } from '#client/lib/table-setting.ts';
import { Checkbox, RadioGroup } from '#client/ui/choice.tsx';
import { TextButton } from '#client/ui/button.tsx';
import { Picker } from '#client/ui/picker.tsx';
import { Popover } from '#client/ui/popover.tsx';
import { exportAddress, type ExportFormat } from '../api.ts';
import { columnNames, columnWords, fixedColumns, readHidden, shortWordsOfSort, wordsOfSort, type ColumnName } from '../columns.ts';
import { groupings, type Grouping } from '../search-state.ts';

const quiet = 'min-h-6 text-second hover:text-ink hover:underline underline-offset-4 aria-expanded:text-ink';

const groupingWords: Readonly<Record<Grouping, string>> = { step: 'elementary step', surface: 'surface', source: 'source', none: 'nothing' };

/** "Group by elementary step". */
export function GroupChoice({ grouping, onChange }: { grouping: Grouping; onChange: (grouping: Grouping) => void }) {
  return (
    <Picker
      label="Group by"
      summary={<>Group by <b className="text-ink">{groupingWords[grouping]}</b></>}
      summaryText={groupingWords[grouping]}
      buttonClassName={quiet}
      multiple={false}
      options={groupings.map((value) => ({ value, label: groupingWords[value] }))}
      chosen={[grouping]}
      onChange={([next]) => next && onChange(next)}
    />
  );
}

/** "Sorted by energy, smallest first": every order there is, whether its column is shown or not. */
export function SortChoice({ sort, onChange }: { sort: SortKey; onChange: (sort: SortKey) => void }) {
  return (
    <Picker
      label="Sort by"
      summary={<>Sort by <b className="text-ink">{shortWordsOfSort(sort)}</b></>}
      summaryText={wordsOfSort(sort)}
      buttonClassName={quiet}
      multiple={false}
      options={sortOptions}
      chosen={[sort]}
      onChange={([next]) => next && onChange(next)}
    />
  );
}

const sortOptions = sortKeys.map((value) => ({ value, label: wordsOfSort(value) }));

type Density = Preferences['rows'];

/** How close the rows of tables stand. */
export function useDensity(): Density {
  const [stored] = useLocalStorage(rowsKey, defaultPreferences.rows);
  return stored === 'dense' ? 'dense' : 'comfortable';
}

/** Which columns are hidden. */
export function useHiddenColumns(): ReadonlySet<ColumnName> {
  const [stored] = useLocalStorage(columnsKey, usualColumns);
  return useMemo(() => readHidden(stored), [stored]);
}

interface ColumnChoiceProps {
  hidden: ReadonlySet<ColumnName>;
  density: Density;
  /** A choice to be remembered: on this device, and with the account where there is one. */
  onChange: (choice: Partial<Pick<Preferences, 'hiddenColumns' | 'rows'>>) => void;
}

/** The columns to be shown, and how close the rows stand. */
export function ColumnChoice({ hidden, density, onChange }: ColumnChoiceProps) {
  return (
    <Popover label="Columns" buttonClassName={quiet} align="end" panelClassName="p-4">
      {() => (
        <>
          <RadioGroup
            legend="Rows" name="density" look="segments" value={density} onChange={(rows) => onChange({ rows })}
            choices={[{ value: 'comfortable', label: 'comfortable' }, { value: 'dense', label: 'dense' }]}
          />
          <fieldset className="pt-4">
            <legend className="field-label pb-1">Columns shown</legend>
            {columnNames.filter((name) => !fixedColumns.includes(name)).map((name) => (
              <Checkbox
                key={name}
                label={columnWords[name]}
                checked={!hidden.has(name)}
                onChange={(event) => {
                  const next = new Set(hidden);
                  if (event.target.checked) next.delete(name);
                  else next.add(name);
                  onChange({ hiddenColumns: [...next] });
                }}
              />
            ))}
            <TextButton className="mt-2" onClick={() => onChange({ hiddenColumns: null })}>The usual columns</TextButton>
          </fieldset>
        </>
      )}
    </Popover>
  );
}

const formats: readonly { format: ExportFormat; label: string; hint: string }[] = [
  { format: 'zip', label: 'CSV and BibTeX, in a ZIP', hint: 'with the query, the versions and a checksum of each file' },
  { format: 'csv', label: 'CSV', hint: 'one row per entry, as printed and converted' },
  { format: 'bib', label: 'BibTeX', hint: 'every source cited, once' },
];

/** Files of everything the search finds. */
export function ExportChoice({ filter, total, temperatureK }: { filter: EntryFilter; total: number; temperatureK: number }) {
  return (
    <Popover label="Export" buttonClassName={quiet} align="end" panelClassName="w-[22rem] p-4">
      {(close) => (
        <>
            <p className="field-label">{`All ${total} entries found, with k at ${temperatureK} K`}</p>
          {filter.state?.some((state) => state !== 'accepted') && <p className="field-hint">Files hold accepted entries only, whatever states the list shows.</p>}
            <ul className="py-1">
              {formats.map(({ format, label, hint }) => (
                <li key={format} className="py-1.5">
                  <a href={exportAddress(format, temperatureK, filter)} download onClick={close}>{label}</a>
                  <span className="field-hint block">{hint}</span>
                </li>
              ))}
            </ul>
            <p className="field-hint">The values are literature reports, not design data.</p>
        </>
      )}
    </Popover>
  );
}
