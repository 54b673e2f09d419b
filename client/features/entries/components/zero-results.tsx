import { Link } from 'react-router-dom';
import { printSearch, type EntryFilter, type NearMiss } from '#shared/contracts/entry-search.ts';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import type { Vocabulary } from '#shared/contracts/vocabulary.ts';
import { Button } from '#client/ui/button.tsx';
import { EmptyState } from '#client/ui/states.tsx';
import type { SearchPage } from '../api.ts';
import { filterWords, joinWords, statedRangeWords } from '../filter-words.ts';
import { filtersInForce, type FilterName } from '../search-state.ts';

interface ZeroResultsProps {
  filter: EntryFilter;
  emptiedBy: SearchPage['emptiedBy'];
  nearMisses: readonly NearMiss[];
  withoutStatedRange: number | null;
  unit: EnergyUnit;
  vocabulary: Vocabulary | undefined;
  onChange: (change: Partial<EntryFilter>) => void;
  onClear: () => void;
}

/** Nothing is found: which filter emptied the list, and what would be found without it. */
export function ZeroResults({ filter, emptiedBy, nearMisses, withoutStatedRange, unit, vocabulary, onChange, onClear }: ZeroResultsProps) {
  const inForce = filtersInForce(filter);
  if (inForce.length === 0) {
    return <EmptyState title="The store holds no accepted entry yet"><p>Entries appear here once a reviewer has accepted them.</p></EmptyState>;
  }
  const known = [...(emptiedBy ?? [])].filter(({ filter: name }, at, all) => all.findIndex((one) => namesOf(one.filter)[0] === namesOf(name)[0]) === at).sort((a, b) => b.totalWithout - a.totalWithout);
  const helps = known.filter(({ totalWithout }) => totalWithout > 0);
  return (
    <EmptyState title={filter.state?.some((state) => state !== 'accepted') ? 'No entry answers this question' : 'No accepted entry answers this question'} actions={<Button onClick={onClear}>Take all filters away</Button>}>
      {helps.length > 0 ? (
        <>
          <p>{inForce.length === 1 ? 'This filter empties the list:' : 'Each of these filters empties the list together with the others:'}</p>
          <ul className="pt-2 text-ink">
            {helps.map(({ filter: name, totalWithout }) => {
              const names = namesOf(name).filter((one) => inForce.includes(one));
              const words = names.map((one) => filterWords(one, filter, unit, vocabulary));
              const title = words[0]?.title ?? name;
              const said = [...new Set(words.map(({ value }) => value))].join(', ');
              return (
                <li key={name} className="flex flex-wrap items-baseline gap-x-4 gap-y-1 border-b border-hairline py-2">
                  <span className="min-w-0 flex-1 basis-60">{title}: <strong>{said}</strong></span>
                  <Button small onClick={() => onChange(Object.fromEntries(names.map((one) => [one, undefined])))}>
                    {`Take it away: ${totalWithout} ${totalWithout === 1 ? 'entry' : 'entries'}`}
                  </Button>
                </li>
              );
            })}
          </ul>
        </>
      ) : <p>No single filter is to blame: taking any one of them away still finds nothing. Take several away, or all.</p>}
      {nearMisses.length > 0 && (
        <>
          <p className="pt-4">Near this question there are:</p>
          <ul className="pt-1 text-ink">
            {nearMisses.map((miss) => (
              <li key={`${miss.kind} ${JSON.stringify(miss.change)}`} className="border-b border-hairline py-2">
                <Link to={nearAddress(filter, miss)}>{nearMissWords(miss)}</Link>
              </li>
            ))}
          </ul>
        </>
      )}
      {withoutStatedRange !== null && withoutStatedRange > 0 && <p className="pt-3">{statedRangeWords(withoutStatedRange, filter.validAt)}</p>}
    </EmptyState>
  );
}

/** The address of a near miss: the question with its change of filters. */
export function nearAddress(filter: EntryFilter, { change }: NearMiss): string {
  const changed = Object.fromEntries(Object.entries(change).map(([name, values]) => [name, values ?? undefined]));
  return `/search?${printSearch({ ...filter, ...changed }).toString()}`;
}

/** What a near miss is and how much there is of it: "6 entries on facet 0001". */
export function nearMissWords({ kind, count, change }: NearMiss): string {
  const entries = `${count} ${count === 1 ? 'entry' : 'entries'}`;
  const values = (name: string) => joinWords((change[name] ?? []).map((value) => value.replaceAll('-', ' ')), 'or');
  switch (kind) {
    case 'other-facet': return `${entries} on the facet ${(change['facet'] ?? []).join(', ')}`;
    case 'reverse-step': return `${entries} for the reverse: ${values('stepClass')}${change['species'] ? ` with ${values('species')}` : ''}`;
    case 'other-method-class': return `${entries} that ${count === 1 ? 'is' : 'are'} ${values('methodClass')}`;
    case 'alloys-containing': return `${entries} on materials that contain ${joinWords(change['contains'] ?? [], 'or')}`;
  }
}

/** The filters that a name of the answer stands for: limits are taken away together. */
function namesOf(name: string): FilterName[] {
  if (name.startsWith('value')) return ['valueMin', 'valueMax'];
  if (name.startsWith('year')) return ['yearFrom', 'yearTo'];
  if (name === 'validFrom' || name === 'validTo') return ['validFrom', 'validTo'];
  return [name as FilterName];
}
