import { useParams } from 'react-router-dom';
import { ReviewPage } from '#client/features/reviews/components/review-page.tsx';
import { RequireRole } from '#client/routes/sign-in/require-role.tsx';
import { NotFoundState } from '#client/ui/states.tsx';

/** One submission to review. */
export function Component() {
  const { submission } = useParams();
  return (
    <RequireRole role="reviewer" title="Review">
      {() => (submission ? <ReviewPage key={submission} submission={submission} /> : <NotFoundState />)}
    </RequireRole>
  );
}
