import { isRouteErrorResponse, Link, useParams, useRevalidator, useRouteError } from 'react-router';
import { Button, buttonClass } from '../components/Button.tsx';
import { ApiProblem, sentenceOf } from '../lib/ApiProblem.ts';
import { paths } from '../lib/paths.ts';
import { NotFound } from './NotFound.tsx';
import { PlainPage } from './PlainPage.tsx';

export interface RouteErrorProps {
  /** Around a page of a production, or around everything. */
  inside: 'production' | 'everything';
}

/** What a screen shows when it cannot be shown: what happened, that nothing was lost, what to do. */
export function RouteError({ inside }: RouteErrorProps) {
  const { slug } = useParams();
  const error = useRouteError();
  const revalidator = useRevalidator();

  const status = error instanceof ApiProblem ? error.status : isRouteErrorResponse(error) ? error.status : 500;
  if (status === 404 && inside === 'production') return <NotFound home={paths.feed(slug!)} />;
  if (status === 404 && !slug) return <NotFound home="/" />;
  if (status === 404 || status === 403) {
    return (
      <PlainPage
        title="No such production for you"
        action={
          <Link to="/" className={buttonClass('primary')}>
            Go to your own
          </Link>
        }
      >
        Either nothing has this name, or you are not one of its people: only they see a production. If you should be one
        of them, ask its owner to add you.
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
