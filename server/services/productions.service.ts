import type { Production as WireProduction } from '../../shared/api/productions.ts';
import { Membership } from '../entities/Membership.ts';
import type { Deps } from '../deps.ts';
import { presentProduction } from '../presenters/productions.presenter.ts';
import { accessBySlug } from './access.ts';

/** A production and its people. */
export async function readProduction(deps: Deps, userId: string, slug: string): Promise<WireProduction> {
  const { manager } = deps.dataSource;
  const { production, actor } = await accessBySlug(manager, userId, slug);
  const memberships = await manager.find(Membership, {
    where: { productionId: production.id },
    relations: { user: true },
    order: { user: { name: 'ASC' } },
  });
  return presentProduction(production, memberships, actor.role!);
}
