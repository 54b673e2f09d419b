import { useRouteError } from 'react-router-dom';
import { useTitle } from '#client/lib/use-title.ts';
import { ErrorState, StatePanel } from '#client/ui/states.tsx';
import { Button } from '#client/ui/button.tsx';

/** What a page shows instead of itself when it fails, inside the shell, so that one can go elsewhere. */
export function RouteError() {
  const error = useRouteError();
  useTitle('Error');
  // A page's code that is no longer on the server: the application was renewed while this window was open.
  if (error instanceof TypeError && /import|module|fetch/i.test(error.message)) {
    return (
      <StatePanel line="broken" title="This page could not be loaded" actions={<Button onClick={() => location.reload()}>Reload</Button>}>
        <p>Sillstone may have been renewed since you opened it, or the connection was lost. Reload to go on.</p>
      </StatePanel>
    );
  }
  return <ErrorState error={error} onRetry={() => location.reload()} />;
}
