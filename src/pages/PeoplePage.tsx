import { useParams } from 'react-router';
import { PageHead } from '../components/PageHead.tsx';
import { PeopleList } from '../features/people/PeopleList.tsx';
import { useActor } from '../lib/queries/useActor.ts';

export function PeoplePage() {
  const slug = useParams().slug!;
  const actor = useActor(slug);
  return (
    <div className="mx-auto max-w-[90rem] px-3.5 py-3.5 lg:px-7">
      <PageHead title="People">
        <span className="text-graphite">who is on this production, and what each of them does here</span>
      </PageHead>
      <PeopleList slug={slug} me={actor.userId} />
    </div>
  );
}
