import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { printSearch } from '#shared/contracts/entry-search.ts';
import type { EntryDetail } from '#shared/contracts/entries.ts';
import { readAccession } from '#shared/domain/accession.ts';
import { stateWords, type State } from '#shared/domain/states.ts';
import { useSession } from '#client/app/session.ts';
import { formatDate } from '#client/lib/dates.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { useTitle } from '#client/lib/use-title.ts';
import { CheckBars } from '#client/ui/check-bars.tsx';
import { Equation } from '#client/ui/equation.tsx';
import { PageHead, type TrailStep } from '#client/ui/page-head.tsx';
import { ErrorState, LoadingState, NotFoundState } from '#client/ui/states.tsx';
import { Tag, type TagKind } from '#client/ui/tag.tsx';
import { entryOptions } from '#client/features/entries/api.ts';
import { entryTitle } from '#client/features/entries/entry-words.ts';
import { EntryActions } from '#client/features/entries/components/entry-actions.tsx';
import { EntryChanges } from '#client/features/entries/components/entry-changes.tsx';
import { EntryCite } from '#client/features/entries/components/entry-cite.tsx';
import { EntryFacts } from '#client/features/entries/components/entry-facts.tsx';
import { EntryHistory } from '#client/features/entries/components/entry-history.tsx';
import { EntryNotices } from '#client/features/entries/components/entry-notices.tsx';
import { EntryReverse, reverseChecks } from '#client/features/entries/components/entry-reverse.tsx';
import { EntryScale } from '#client/features/entries/components/entry-scale.tsx';
import { EntryDerivations, EntryQuantities } from '#client/features/entries/components/entry-quantities.tsx';
import { RatePlot } from '#client/features/entries/components/rate-plot.tsx';
import { SourceCard } from '#client/features/entries/components/source-card.tsx';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';
import { Collect } from '#client/routes/collections/collect.tsx';

/** One entry: what is printed, what it became and how, under which conditions, from where. */
export function Component() {
  const { accession: typed = '', version: typedVersion } = useParams();
  const accession = readAccession(typed);
  const version = typedVersion === undefined ? null : /^[1-9]\d{0,5}$/.test(typedVersion) ? Number(typedVersion) : Number.NaN;
  if (accession === null) return <Missing detail={`"${typed.slice(0, 40)}" is no accession: six characters and a check character, such as 222-222-2. Look for a slip of the pen.`} />;
  if (Number.isNaN(version)) return <Missing detail="A version is a whole number from 1." />;
  return <EntryPage accession={accession} version={version} />;
}

function Missing({ detail }: { detail: string }) {
  useTitle('No such entry');
  return <><h1 className="sr-only">No such entry</h1><NotFoundState detail={detail} /></>;
}

function EntryPage({ accession, version }: { accession: string; version: number | null }) {
  const { temperatureK, unit } = useInstrument();
  const { data: entry, error, refetch } = useQuery(entryOptions(accession, version, temperatureK));
  const { me } = useSession();
  useTitle(entry ? entryTitle(entry) : `Entry ${accession}`);
  if (!entry) {
    return (
      <>
        <h1 className="sr-only">{`Entry ${accession}`}</h1>
        {error ? <ErrorState error={error} onRetry={() => void refetch()} /> : <LoadingState what={`entry ${accession}`} rows={8} />}
      </>
    );
  }
  return (
    <article>
      <Head entry={entry} />
      <EntryNotices entry={entry} />
      <EntryActions entry={entry}>{entry.version !== null && <Collect accessions={[entry.accession]} />}</EntryActions>
      <div className="grid gap-x-10 gap-y-9 wide:grid-cols-[minmax(0,1fr)_minmax(0,29rem)]">
        <div className="flex min-w-0 flex-col gap-9">
          <EntryQuantities entry={entry} unit={unit} />
          <EntryDerivations entry={entry} />
          <EntryFacts entry={entry} />
          <section>
            <h2 className="pb-2">Checks</h2>
            <CheckBars checks={[...entry.checks, ...reverseChecks(entry, unit)]} none="None was raised: nothing in the record or in the store speaks against the value." />
          </section>
        </div>
        <div className="flex min-w-0 flex-col gap-9">
          <RatePlot entry={entry} temperatureK={temperatureK} />
          <SourceCard entry={entry} />
          <EntryCite entry={entry} temperatureK={temperatureK} demonstration={me?.demonstration ?? false} />
          <EntryHistory entry={entry} />
        </div>
      </div>
      <EntryChanges entry={entry} unit={unit} />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-x-10 gap-y-9 pt-10 wide:grid-cols-[repeat(2,minmax(0,1fr))]">
        <EntryScale entry={entry} unit={unit} />
        <EntryReverse entry={entry} unit={unit} />
      </div>
    </article>
  );
}

const stateTags: Partial<Record<State, TagKind>> = { accepted: 'result', retracted: 'refusal', rejected: 'refusal', superseded: 'doubt', returned: 'doubt' };

function Head({ entry }: { entry: EntryDetail }) {
  const { step, surface, state, accession, version, acceptedAt } = entry;
  const title = entryTitle(entry);
  const trail: TrailStep[] = [
    { label: 'Search', to: '/search' },
    ...(step ? [{ label: <Equation equation={step.equation} />, to: `/search?${printSearch({ step: [step.key] })}` }] : []),
    ...(surface ? [{ label: <SurfaceLabel label={surface.label} />, ...(surface.metal ? { to: `/search?${printSearch({ metal: [surface.metal], ...(surface.facet ? { facet: [surface.facet] } : {}) })}` } : {}) }] : []),
  ];
  return (
    <PageHead
      title={surface && title.endsWith(surface.label) ? <>{title.slice(0, -surface.label.length)}<SurfaceLabel label={surface.label} /></> : title}
      titleText={title}
      trail={trail}
      aside={(
        <>
          <Tag kind={stateTags[state] ?? 'plain'}>{state === 'accepted' && acceptedAt ? `accepted ${formatDate(acceptedAt)}` : stateWords[state]}</Tag>
          <span>{`entry ${accession}, ${version === null ? `revision ${entry.revision}` : `version ${version}`}`}</span>
        </>
      )}
    />
  );
}
