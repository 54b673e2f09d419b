import { useQuery } from '@tanstack/react-query';
import type { ReviewView } from '#shared/contracts/reviews.ts';
import { stateWords } from '#shared/domain/states.ts';
import { formatAge, formatDateTime } from '#client/lib/dates.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { Button, LinkButton } from '#client/ui/button.tsx';
import { CheckBars } from '#client/ui/check-bars.tsx';
import { Equation } from '#client/ui/equation.tsx';
import { NeighbourScale } from '#client/ui/neighbour-scale.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { PageHead } from '#client/ui/page-head.tsx';
import { printedText, quantityText } from '#client/ui/quantity-value.tsx';
import { ErrorState, LoadingState } from '#client/ui/states.tsx';
import { reviewOptions, useReviewActions } from '../api.ts';
import { refusalWords } from '../refusals.ts';
import { Changes, EarlierRounds } from './earlier-rounds.tsx';
import { Decided } from './decided.tsx';
import { DecisionForm } from './decision-form.tsx';
import { Discussion } from './discussion.tsx';
import { SubmittedValue } from './submitted-value.tsx';

/** One submission, held against the paper. */
export function ReviewPage({ submission }: { submission: string }) {
  const { data: view, error, refetch } = useQuery(reviewOptions(submission));
  if (error && !view) return <><PageHead title="Review" trail={[{ label: 'Review', to: '/review' }]} /><ErrorState error={error} onRetry={() => void refetch()} /></>;
  if (!view) return <><PageHead title="Review" trail={[{ label: 'Review', to: '/review' }]} /><LoadingState what="the submission" /></>;
  return <Review view={view} />;
}

function Review({ view }: { view: ReviewView }) {
  const { unit } = useInstrument();
  const { entry, claim } = view;
  const primary = entry.quantities[0];
  const on = entry.surface ? ` on ${entry.surface.label}` : '';
  const own = entry.quantities.find((quantity) => quantity.unit === 'kJ/mol');
  const at = own?.value ?? own?.high ?? own?.low ?? null;
  const standing = view.decision ? 'decided'
    : claim ? `claimed by ${claim.mine ? 'you' : claim.by} until ${formatDateTime(claim.until)}`
      : view.state === 'submitted' || view.state === 'under-review' ? 'not claimed' : stateWords[view.state];
  return (
    <>
      <PageHead
        titleText={`Review ${entry.accession}`}
        trail={[
          { label: 'Review', to: '/review' },
          { label: `submission by ${view.contributor}, handed in ${formatAge(view.submittedAt) === 'just now' ? 'just now' : `${formatAge(view.submittedAt)} ago`}${view.round > 1 ? `, round ${view.round}` : ''}` },
          { label: standing },
        ]}
        title={<>{entry.step ? <Equation display equation={entry.step.equation} /> : 'No elementary step'}{on}{primary && <>: <samp>{printedText(primary)}</samp></>}</>}
        aside={<ClaimButtons view={view} />}
      />
      <div className="grid gap-x-9 gap-y-9 mid:grid-cols-2 wide:grid-cols-3">
        <SubmittedValue entry={entry} />
        <div className="flex flex-col gap-8">
          <section aria-labelledby="neighbours">
            <h2 id="neighbours" className="pb-2">Among its neighbours</h2>
            <NeighbourScale
              neighbours={view.neighbours} energyUnit={unit}
              own={own && at !== null ? { energyKJPerMol: at, label: `this submission, ${quantityText(own, unit)}` } : null}
            />
          </section>
          <section aria-labelledby="checks">
            <h2 id="checks" className="pb-2">Checks</h2>
            <CheckBars checks={entry.checks} none="No check has raised a doubt." />
          </section>
          <Changes changes={view.changes} />
          <EarlierRounds earlier={view.earlier} />
        </div>
        <div className="flex flex-col gap-8 mid:max-wide:col-span-2">
          <section aria-labelledby="against">
            <h2 id="against" className="pb-2">Against the paper</h2>
            <Decided view={view} />
            {!view.decision && view.whyNot && <Notice kind="doubt" title={view.own ? 'This is yours.' : 'Not open to you now.'} className="mb-4">{view.whyNot}</Notice>}
            <DecisionForm key={view.submission} view={view} />
          </section>
          <Discussion view={view} />
        </div>
      </div>
    </>
  );
}

/** Claim, keep or release; a submission that is claimed is nobody else's for 72 hours. */
function ClaimButtons({ view }: { view: ReviewView }) {
  const { claim, release, look } = useReviewActions(view.submission);
  const refused = claim.error ?? release.error;
  const mine = view.claim?.mine === true;
  return (
    <>
      {refused && <Notice kind="refusal" live title={refusalWords(refused).title}>{refusalWords(refused).text}</Notice>}
      {view.actions.includes('claim') && !mine && (
        <Button busy={claim.isPending} onClick={() => claim.mutate(undefined, { onError: () => void look() })}>Claim for 72 hours</Button>
      )}
      {view.actions.includes('release') && <Button look="quiet" busy={release.isPending} onClick={() => release.mutate()}>Release</Button>}
      {view.next && !view.decision && <LinkButton look="quiet" to={`/review/${view.next}`}>Next in the queue</LinkButton>}
    </>
  );
}
