import { useNavigate } from 'react-router';
import type { Production } from '../../shared/api/productions.ts';
import type { Session } from '../../shared/api/session.ts';
import { buttonClass } from '../components/Button.tsx';
import { Menu } from '../components/Menu.tsx';
import { paths } from '../lib/paths.ts';

/** Which production this is, and the way to the others one belongs to. */
export function ProductionMenu({ production, session }: { production: Production; session: Session | null }) {
  const navigate = useNavigate();
  const others = session?.productions ?? [];
  if (others.length < 2) {
    return <span className="hidden font-semibold text-graphite lg:block">{production.name}</span>;
  }
  return (
    <div className="hidden lg:block">
      <Menu
        label={`Production: ${production.name}. Open another`}
        className={buttonClass('plain', 'regular')}
        items={others.map((one) => ({
          label: one.name,
          checked: one.slug === production.slug,
          run: () => void navigate(paths.feed(one.slug)),
        }))}
      >
        {production.name} <span aria-hidden="true">▾</span>
      </Menu>
    </div>
  );
}
