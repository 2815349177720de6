import { Link } from 'react-router';
import { buttonClass } from '../components/Button.tsx';
import { PlainPage } from './PlainPage.tsx';

/** @param home where there is something */
export function NotFound({ home }: { home: string }) {
  return (
    <PlainPage
      title="Nothing at this address"
      action={
        <Link to={home} className={buttonClass('primary')}>
          Go to the feed
        </Link>
      }
    >
      The shot may have another number now, or the address lost a part on its way to you.
    </PlainPage>
  );
}
