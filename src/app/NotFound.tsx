import { Link, useParams } from 'react-router';
import { buttonClass } from '../components/Button.tsx';
import { paths } from '../lib/paths.ts';
import { PlainPage } from './PlainPage.tsx';

export function NotFound() {
  const { slug } = useParams();
  return (
    <PlainPage
      title="Nothing at this address"
      action={
        <Link to={slug ? paths.feed(slug) : '/'} className={buttonClass('primary')}>
          Go to the feed
        </Link>
      }
    >
      The shot may have another number now, or the address lost a part on its way to you.
    </PlainPage>
  );
}
