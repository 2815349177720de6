import { useRevalidator, useRouteError } from 'react-router';
import { Button } from '../components/Button.tsx';
import { ApiProblem, sentenceOf } from '../lib/ApiProblem.ts';
import { NotFound } from './NotFound.tsx';
import { PlainPage } from './PlainPage.tsx';

/** What a screen shows when it cannot be shown: what happened, that nothing was lost, what to do. */
export function RouteError() {
  const error = useRouteError();
  const revalidator = useRevalidator();

  if (error instanceof ApiProblem && error.status === 404) return <NotFound />;
  if (error instanceof ApiProblem && error.status === 403) {
    return (
      <PlainPage title="This production is not open to you">
        Only its own people see a production. If you should be one of them, ask its owner to add you.
      </PlainPage>
    );
  }
  return (
    <PlainPage
      title="This page did not open"
      action={
        <>
          <Button kind="primary" onClick={() => void revalidator.revalidate()}>
            Try again
          </Button>
          <Button onClick={() => window.location.reload()}>Load the page anew</Button>
        </>
      }
    >
      {sentenceOf(error)}
    </PlainPage>
  );
}
