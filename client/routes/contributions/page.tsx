import { useLocation, useNavigate, useSearchParams } from 'react-router-dom';
import { states, stateWords } from '#shared/domain/states.ts';
import { MyEntries } from '#client/features/contribute/components/my-entries.tsx';
import { useMyEntries } from '#client/features/contribute/use-my-entries.ts';
import { RequireRole } from '#client/routes/sign-in/require-role.tsx';
import { LinkButton } from '#client/ui/button.tsx';
import { ChoiceLine } from '#client/ui/choice-line.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { PageHead } from '#client/ui/page-head.tsx';

const title = 'My submissions';

/** My submissions and where they stand. */
export function Component() {
  return <RequireRole role="contributor" title={title}>{() => <Contributions />}</RequireRole>;
}

function Contributions() {
  const [search] = useSearchParams();
  const location = useLocation();
  const navigate = useNavigate();
  const state = states.find((one) => one === search.get('state')) ?? null;
  const { counts } = useMyEntries(state);
  const submitted = (location.state as { submitted?: string } | null)?.submitted;
  const all = Object.values(counts).reduce((sum, count) => sum + count, 0);
  return (
    <>
      <PageHead title={title} aside={<LinkButton look="primary" to="/contribute">Enter a value</LinkButton>} />
      {submitted && (
        <Notice kind="result" live title={`Entry ${submitted} is submitted for review.`} className="mb-5">
          It is frozen until a reviewer has held it against the paper; you see here when that happens.
        </Notice>
      )}
      <ChoiceLine
        label="State"
        choices={[
          { key: 'all', label: 'all', count: all, to: '?', current: state === null },
          ...states.filter((one) => counts[one] || one === state).map((one) => (
            { key: one, label: stateWords[one], count: counts[one] ?? 0, to: `?state=${one}`, current: one === state }
          )),
        ]}
      />
      <MyEntries state={state} onOpenDraft={(accession) => void navigate(`/contribute/${accession}`)} />
    </>
  );
}
