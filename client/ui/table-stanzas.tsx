import { useId } from 'react';
import { Checkbox } from './choice.tsx';
import { SelectField } from './field.tsx';
import type { DataColumn, DataRow, TableSort } from './table-model.ts';
import type { TableLine } from './table-rows.tsx';
import type { DataTableProps } from './table.tsx';

interface StanzaListProps<T extends object> extends DataTableProps<T> {
  lines: readonly TableLine<T>[];
  chosen: ReadonlySet<string>;
  onToggle: (row: DataRow<T>) => void;
}

/** The rows of a table as short stanzas, where the page is too narrow for columns. */
export function StanzaList<T extends object>(
  { caption, columns, lines, rowLabel, sort = null, onSort, chosen, onChosen, onToggle, stanza, empty, stale, stanzaSort = true }: StanzaListProps<T>,
) {
  const id = useId();
  return (
    <section aria-labelledby={id} aria-busy={stale || undefined} className={stale ? 'data-table-stale' : undefined}>
      <h2 className="sr-only" id={id}>{caption}</h2>
      {onSort && stanzaSort && <StanzaSort columns={columns} sort={sort} onSort={onSort} />}
      <ol className="stanzas">
        {lines.map((line) => line.heading
          ? <li key={`group ${line.heading.key}`} className="stanza-group">{line.heading.label}</li>
          : (
            <li key={line.row.id} className={`stanza ${chosen.has(line.row.id) ? 'stanza-chosen' : ''}`}>
              {onChosen && <Checkbox className="stanza-choose" label={`Choose ${rowLabel(line.row.original)}`} hideLabel checked={chosen.has(line.row.id)} onChange={() => onToggle(line.row)} />}
              <div className="min-w-0 flex-1">{stanza ? stanza(line.row.original) : <Pairs columns={columns} row={line.row.original} />}</div>
            </li>
          ))}
      </ol>
      {lines.length === 0 && empty}
    </section>
  );
}

function Pairs<T extends object>({ columns, row }: { columns: readonly DataColumn<T>[]; row: T }) {
  return (
    <dl>
      {columns.map((column) => (
        <div key={column.id} className={column.rowHeader ? 'stanza-head' : 'stanza-pair'}>
          <dt className={column.rowHeader ? 'sr-only' : undefined}>{column.headerText ?? column.header}{column.unit && <> ({column.unit})</>}</dt>
          <dd className={column.printed ? 'printed' : undefined}>{column.cell(row)}</dd>
        </div>
      ))}
    </dl>
  );
}

function StanzaSort<T>({ columns, sort, onSort }: { columns: readonly DataColumn<T>[]; sort: TableSort | null; onSort: (sort: TableSort | null) => void }) {
  const choices = columns.flatMap((column) => {
    if (column.sortKey === undefined) return [];
    const name = column.headerText ?? (typeof column.header === 'string' ? column.header : column.id);
    return [
      { value: `${column.sortKey} up`, label: `${name}, ${column.numeric ? 'smallest' : 'a to z'} first` },
      { value: `${column.sortKey} down`, label: `${name}, ${column.numeric ? 'largest' : 'z to a'} first` },
    ];
  });
  if (choices.length === 0) return null;
  return (
    <SelectField
      className="pb-3"
      label="Sort by"
      choices={choices}
      empty="the usual order"
      value={sort ? `${sort.key} ${sort.descending ? 'down' : 'up'}` : ''}
      onChange={(event) => {
        const [key, sense] = event.target.value.split(' ');
        onSort(key ? { key, descending: sense === 'down' } : null);
      }}
    />
  );
}
