import { useSuspenseQuery, useQuery } from '@tanstack/react-query';
import type { Member, Role } from '../../../shared/api/people.ts';
import { Card } from '../../components/Card.tsx';
import { InkRing } from '../../components/InkRing.tsx';
import { hereOptions, productionOptions } from '../../lib/queries/production.ts';

const DOES: Record<Role, string> = {
  animator: 'An animator draws shots, posts strips and talks about every take.',
  mentor: 'A mentor looks at takes: clears them, asks for another pass, or waives what is off.',
  producer: 'A producer follows every shot until it is through, and moves takes that landed on the wrong shot.',
  owner: 'An owner keeps the production and its people, and looks at takes as a mentor does.',
};
const TITLES: Record<Role, string> = {
  owner: 'Owners',
  producer: 'Producers',
  mentor: 'Mentors',
  animator: 'Animators',
};
const ORDER: Role[] = ['mentor', 'animator', 'producer', 'owner'];

/** The people of a production under what they do here. */
export function PeopleList({ slug, me }: { slug: string; me: string }) {
  const { data: production } = useSuspenseQuery(productionOptions(slug));
  const { data: here = [] } = useQuery(hereOptions(slug));
  const present = new Set(here.map((person) => person.id));
  const groups = ORDER.map((role) => ({ role, members: production.members.filter((one) => one.role === role) }));

  return (
    <div className="grid gap-3.5 md:grid-cols-2">
      {groups
        .filter(({ members }) => members.length > 0)
        .map(({ role, members }) => (
          <Card key={role} className="px-4.5 py-3.5" aria-labelledby={`role-${role}`}>
            <h2 id={`role-${role}`} className="text-lg">
              {members.length === 1 ? TITLES[role].replace(/s$/, '') : TITLES[role]}
            </h2>
            <p className="text-sm text-graphite">{DOES[role]}</p>
            <ul className="mt-2">
              {members.map((member) => (
                <MemberRow key={member.id} member={member} isMe={member.id === me} isHere={present.has(member.id)} />
              ))}
            </ul>
          </Card>
        ))}
    </div>
  );
}

function MemberRow({ member, isMe, isHere }: { member: Member; isMe: boolean; isHere: boolean }) {
  return (
    <li className="flex min-h-11 items-center gap-3 border-t border-rule first:border-0">
      <InkRing person={member} named />
      <span className="flex-1 font-semibold">
        {member.name}
        {isMe && <span className="font-normal text-graphite"> (you)</span>}
      </span>
      {isHere && <span className="text-sm text-graphite">here now</span>}
    </li>
  );
}
