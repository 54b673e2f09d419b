import { Fragment } from 'react';
import type { Match } from '#shared/contracts/entry-search.ts';

/** Letters before the first found word, and of the whole passage, that are shown. */
const before = 24;
const most = 72;
/** Passages of one row. */
const passages = 2;

const fieldWords: Readonly<Record<Match['field'], string>> = {
  title: 'title', authors: 'authors', container: 'journal', year: 'year', doi: 'DOI', step: 'elementary step', stepClass: 'class of step', species: 'species', surface: 'surface',
  metal: 'metal', support: 'support', promoter: 'promoter', method: 'method', conditions: 'conditions', note: 'note', accession: 'accession',
};

/** A stretch of a text, found or not. */
export interface Stretch {
  text: string;
  found: boolean;
}

/** A text in stretches by where words were found in it, cut around the first of them where it is long. Ranges that lie outside are left. */
export function stretches({ text, ranges }: Pick<Match, 'text' | 'ranges'>): Stretch[] {
  const sound = ranges.filter(([from, to]) => from >= 0 && from < to && to <= text.length);
  const first = sound[0]?.[0] ?? 0;
  const start = text.length <= most || first <= before ? 0 : text.lastIndexOf(' ', first - before) + 1;
  const room = start + most;
  const end = text.length <= room ? text.length : Math.max(sound[0]?.[1] ?? 0, text.lastIndexOf(' ', room));
  const cut: Stretch[] = start > 0 ? [{ text: '… ', found: false }] : [];
  let at = start;
  for (const [from, to] of sound) {
    if (from < at || from >= end) continue;
    if (from > at) cut.push({ text: text.slice(at, from), found: false });
    cut.push({ text: text.slice(from, Math.min(to, end)), found: true });
    at = Math.min(to, end);
  }
  if (at < end) cut.push({ text: text.slice(at, end), found: false });
  if (end < text.length) cut.push({ text: ' …', found: false });
  return cut;
}

/** Where the words of the search stand in an entry, marked. */
export function FoundIn({ matches }: { matches: readonly Match[] }) {
  const shown = matches.slice(0, passages);
  const others = matches.slice(passages).map(({ field }) => fieldWords[field]);
  return (
    <span className="found-in">
      {shown.map((match) => (
        <span className="found-passage" key={match.field}>
          <span className="found-field">{fieldWords[match.field]}</span>{' '}
          {stretches(match).map(({ text, found }, index) => (found ? <mark key={index}>{text}</mark> : <Fragment key={index}>{text}</Fragment>))}
        </span>
      ))}
      {others.length > 0 && <span className="found-field">{`also ${others.join(', ')}`}</span>}
    </span>
  );
}
