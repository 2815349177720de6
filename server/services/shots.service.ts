import type { ShotWithTakes } from '../../shared/api/shots.ts';
import { Shot } from '../entities/Shot.ts';
import { Take } from '../entities/Take.ts';
import type { Deps } from '../deps.ts';
import { notFound } from '../errors.ts';
import { presentShotWithTakes } from '../presenters/shots.presenter.ts';
import { accessBySlug } from './access.ts';
import { groupBy } from './groupBy.ts';
import { loadTakes } from './loadTakes.ts';

/** Every shot of a production with its takes, by number. */
export async function readSheet(deps: Deps, userId: string, slug: string): Promise<ShotWithTakes[]> {
  const { manager } = deps.dataSource;
  const { production } = await accessBySlug(manager, userId, slug);
  const shots = await manager.findBy(Shot, { productionId: production.id });
  const ids = await manager.find(Take, {
    where: { productionId: production.id },
    select: { id: true },
    order: { number: 'ASC' },
  });
  const takes = groupBy(
    await loadTakes(
      manager,
      ids.map(({ id }) => id),
    ),
    ({ take }) => take.shotId,
  );
  return shots.sort(byNumber).map((shot) => presentShotWithTakes(shot, takes.get(shot.id) ?? []));
}

/** One shot with its takes, first to last. */
export async function readShot(deps: Deps, userId: string, slug: string, shotNumber: string): Promise<ShotWithTakes> {
  const { manager } = deps.dataSource;
  const { production } = await accessBySlug(manager, userId, slug);
  const shot = await manager.findOneBy(Shot, { productionId: production.id, number: shotNumber });
  if (!shot) throw notFound('shot');
  const ids = await manager.find(Take, { where: { shotId: shot.id }, select: { id: true }, order: { number: 'ASC' } });
  const takes = await loadTakes(
    manager,
    ids.map(({ id }) => id),
  );
  return presentShotWithTakes(shot, takes);
}

const numbers = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

/** Shot 9 stands before shot 10. */
function byNumber(a: Shot, b: Shot): number {
  return numbers.compare(a.number, b.number);
}
