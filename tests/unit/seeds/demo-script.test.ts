import { describe, expect, it } from 'vitest';
import { readBibtex } from '#server/services/citation/bibtex-read.ts';
import { readVocabulary } from '#seeds/vocabulary/read-vocabulary.ts';
import {
  readDemoEntries, readDemoNotices, readDemoPeople, readDemoSources, readLookupOnlySource, splitBibliography,
} from '#seeds/demo/read-demo.ts';
import { primarySymbol } from '#shared/domain/kinds.ts';
import { states } from '#shared/domain/states.ts';

const entries = readDemoEntries();
const people = readDemoPeople();
const sources = splitBibliography(readDemoSources());
const byRow = new Map(entries.map((entry) => [entry.row, entry]));
const withOutcome = (...outcomes: string[]) => entries.filter(({ script }) => outcomes.includes(script.outcome));

describe('the demonstration entries as a set', () => {
  it('has at least 412 entries, 9 metals, 14 equations and 60 sources', () => {
    expect(entries.filter(({ script }) => script.revises === null).length).toBeGreaterThanOrEqual(412);
    expect(withOutcome('accepted').length).toBeGreaterThanOrEqual(412);
    expect([...new Set(entries.flatMap(({ input }) => input.surface?.metal ?? []))].sort()).toEqual(['Co', 'Cu', 'Fe', 'Ir', 'Ni', 'Pd', 'Pt', 'Rh', 'Ru']);
    expect([...new Set(entries.flatMap(({ input }) => input.surface?.formula ?? []))].sort()).toEqual(['CoMo', 'Ni3Fe', 'RuNi']);
    expect(sources).toHaveLength(60);
    expect(new Set(entries.map(({ sourceKey }) => sourceKey)).size).toBe(60);
  });

  it('says of every entry that it is invented', () => {
    for (const { row, input } of entries) expect(input.note, row).toMatch(/^Invented for demonstration\./);
  });

  it('numbers rows once and in order', () => {
    expect(new Set(byRow.keys()).size).toBe(entries.length);
    expect(entries.map(({ row }) => row)).toEqual(entries.map((_, index) => `D${String(index + 1).padStart(3, '0')}`));
  });

  it('holds the primary quantity of its kind in every row', () => {
    for (const { row, input } of entries) {
      const { kind } = input;
      expect(kind, row).toBeDefined();
      expect(input.quantities?.map(({ symbol }) => symbol), row).toContain(kind && primarySymbol[kind]);
    }
  });

  it('uses only techniques, facets and supports of the vocabulary', () => {
    const codes = (kind: string) => new Set(readVocabulary().filter((word) => word.kind === kind).map(({ code }) => code));
    const [techniques, facets, supports] = [codes('technique'), codes('facet'), codes('support')];
    for (const { row, input } of entries) {
      expect(techniques.has(input.method?.technique ?? ''), `${row}: ${input.method?.technique}`).toBe(true);
      if (input.surface?.facet) expect(facets.has(input.surface.facet), `${row}: ${input.surface.facet}`).toBe(true);
      if (input.surface?.support) expect(supports.has(input.surface.support), `${row}: ${input.surface.support}`).toBe(true);
    }
  });

  it('gives computed values an end-state reference and measured ones a valid range', () => {
    for (const { row, input } of withOutcome('accepted')) {
      if (input.method?.class === 'measured') expect(input.validRange?.min ?? 0, row).toBeLessThan(input.validRange?.max ?? 0);
      if (input.kind === 'barrier') expect(input.conditions?.endStateReference, row).toBeDefined();
      expect(input.locator, row).toBeTruthy();
    }
  });

  it('has one accepted value of the associative desorption of nitrogen from Ru(0001) by TPD', () => {
    const found = withOutcome('accepted').filter(({ input }) =>
      input.method?.technique === 'TPD' && input.surface?.metal === 'Ru' && input.surface.facet === '0001' && /^2?N\*.*-> N2 \+ 2\*$/.test(input.step?.equation ?? ''));
    expect(found.map(({ input }) => input.step?.equation)).toEqual(['N* + N* -> N2 + 2*']);
  });
});

describe('what is done with the entries', () => {
  it('leaves some in every state, and some of the contributor account in every state', () => {
    for (const state of states) {
      expect(withOutcome(state).length, state).toBeGreaterThan(0);
      expect(withOutcome(state).some(({ script }) => script.contributor === 'contributor@demo.sillstone.example'), state).toBe(true);
    }
    expect(withOutcome('submitted', 'under-review').length).toBeGreaterThanOrEqual(7);
    expect(withOutcome('under-review').length).toBeGreaterThanOrEqual(2);
  });

  it('never lets a contributor decide on their own entry', () => {
    const reviewers = people.filter(({ role }) => role === 'reviewer' || role === 'curator').map(({ email }) => email);
    for (const { row, script } of entries) {
      expect(people.map(({ email }) => email), row).toContain(script.contributor);
      if (script.reviewer === null) continue;
      expect(reviewers, row).toContain(script.reviewer);
      expect(script.reviewer, row).not.toBe(script.contributor);
      if (script.revises !== null) expect(script.reviewer, row).not.toBe(byRow.get(script.revises)?.script.contributor);
    }
  });

  it('dates everything from September 2025 to November 2026, in order', () => {
    for (const { row, script } of entries) {
      for (const date of [script.submittedAt, script.decidedAt, script.retractedAt]) {
        if (date !== null) expect(date >= '2025-09' && date < '2026-12', `${row}: ${date}`).toBe(true);
      }
      if (script.decidedAt !== null) expect((script.submittedAt ?? '') < script.decidedAt, row).toBe(true);
      if (script.retractedAt !== null) expect((script.decidedAt ?? '9') < script.retractedAt, row).toBe(true);
    }
  });

  it('has what each outcome needs', () => {
    for (const { row, script } of entries) {
      const decided = ['accepted', 'returned', 'rejected', 'superseded', 'retracted'].includes(script.outcome);
      expect(script.submittedAt === null, row).toBe(script.outcome === 'draft');
      expect(script.decidedAt !== null, row).toBe(decided || script.outcome === 'withdrawn');
      expect(script.reviewer !== null, row).toBe(decided || script.outcome === 'under-review');
      expect(script.reason !== null, row).toBe(['returned', 'rejected'].includes(script.outcome));
      if (script.reason !== null) expect(script.comment, row).toBeTruthy();
      expect(script.retractionReason !== null && script.retractedBy !== null && script.retractedAt !== null, row).toBe(script.outcome === 'retracted');
    }
  });

  it('lets each superseded row be revised once, later, by an accepted row of the same source', () => {
    const revisions = entries.filter(({ script }) => script.revises !== null);
    expect(revisions.map(({ script }) => script.revises).sort()).toEqual(withOutcome('superseded').map(({ row }) => row).sort());
    for (const { row, sourceKey, script } of revisions) {
      const earlier = byRow.get(script.revises ?? '');
      expect(earlier?.sourceKey, row).toBe(sourceKey);
      expect((earlier?.script.decidedAt ?? '9') < (script.submittedAt ?? ''), row).toBe(true);
      expect(script.outcome, row).toBe('accepted');
      expect(script.revisionReason, row).toBeTruthy();
    }
  });

  it('leaves five doubtful ones for a reviewer or as a draft', () => {
    const marked = entries.filter(({ script }) => script.mark !== null).map(({ script, input, sourceKey }) => [script.mark, script.outcome, sourceKey, input.quantities?.[0]?.asPrinted]);
    expect(marked).toEqual(expect.arrayContaining([
      ['unit-slip', 'under-review', 'achterberg2001', '152'],
      ['retracted-source', 'submitted', 'hollowbrook2014', expect.any(String)],
      ['quoted', 'under-review', 'abramsson2004', '1.25 ± 0.09'],
      ['duplicate', 'submitted', 'okerekewahl2007', expect.any(String)],
      ['unbalanced', 'draft', 'castellano1985', expect.any(String)],
    ]));
    expect(marked).toHaveLength(5);
  });
});

describe('people and sources', () => {
  it('has the five demonstration accounts, one a role and two reviewers', () => {
    expect(people.filter(({ signsIn }) => signsIn).map(({ email, role }) => [email.split('@')[0], role])).toEqual([
      ['reader', 'reader'], ['contributor', 'contributor'], ['reviewer', 'reviewer'], ['second.reviewer', 'reviewer'], ['curator', 'curator'],
    ]);
    expect(new Set(people.map(({ email }) => email)).size).toBe(people.length);
  });

  it('has every DOI once, under the documentation prefix, and marks every source as invented', () => {
    expect(new Set(sources.map(({ doi }) => doi.toLowerCase())).size).toBe(60);
    for (const { key, doi, bibtex } of sources) {
      expect(doi, key).toMatch(/^10\.5555\/\S+$/);
      expect(bibtex, key).toContain('Invented for demonstration');
    }
  });

  it('has a bibliography that reads without a problem: accents, chemistry, particles, a body as author, a thesis, odd DOIs', () => {
    const { entries: citations, problems } = readBibtex(readDemoSources());
    expect(problems).toEqual([]);
    expect(citations).toHaveLength(60);
    const shown = JSON.stringify(citations);
    for (const feature of ['Sørlie', 'Dvořáčková', '"literal":"Harrowgate Institute for Imagined Interfaces"', '"suffix":"Jr."', 'N<sub>2</sub>', '"type":"thesis"', '<215::aid-aue7>3.0.co;2-k']) {
      expect(shown.toLowerCase()).toContain(feature.toLowerCase());
    }
  });

  it('keeps one source for the DOI look-up alone', () => {
    const [lookup, ...more] = splitBibliography(readLookupOnlySource());
    expect(more).toEqual([]);
    expect(lookup?.doi).toBe('10.5555/aisk.1994.0412');
    expect(sources.some(({ doi }) => doi === lookup?.doi)).toBe(false);
  });

  it('has a retracted and a corrected source', () => {
    const notices = readDemoNotices();
    expect(notices.map(({ type }) => type).sort()).toEqual(['correction', 'retraction']);
    for (const { doi } of notices) expect(sources.some((source) => source.doi === doi), doi).toBe(true);
  });
});
