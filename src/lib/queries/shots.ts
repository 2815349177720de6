import { type QueryClient, queryOptions } from '@tanstack/react-query';
import type { Shot, ShotWithTakes } from '../../../shared/api/shots.ts';
import { shotContracts } from '../../../shared/api/shots.ts';
import type { Take } from '../../../shared/api/takes.ts';
import { call } from '../call.ts';
import { newerShot, newerShotWithTakes, newerTake } from './newer.ts';
import { productionKey } from './production.ts';

type Sheet = { shots: ShotWithTakes[] };

/** The shot sheet: every shot with its takes, by number. */
export function sheetOptions(slug: string) {
  return queryOptions({
    queryKey: [...productionKey(slug), 'sheet'],
    queryFn: ({ signal }) => call(shotContracts.sheet, { params: { slug }, signal }),
    structuralSharing: (have, got) => newerSheet(have as Sheet | undefined, got as Sheet),
  });
}

/** One shot with its takes. */
export function shotOptions(slug: string, shotNumber: string) {
  return queryOptions({
    queryKey: [...productionKey(slug), 'shot', shotNumber],
    queryFn: ({ signal }) => call(shotContracts.read, { params: { slug, shotNumber }, signal }),
    structuralSharing: (have, got) =>
      have ? newerShotWithTakes(have as ShotWithTakes, got as ShotWithTakes) : (got as ShotWithTakes),
  });
}

function newerSheet(have: Sheet | undefined, got: Sheet): Sheet {
  if (!have) return got;
  const had = new Map(have.shots.map((shot) => [shot.id, shot]));
  const asked = new Set(got.shots.map((shot) => shot.id));
  const shots = got.shots.map((shot) => {
    const before = had.get(shot.id);
    return before ? newerShotWithTakes(before, shot) : shot;
  });
  // A shot that arrived over the socket while the sheet was being fetched.
  const newest = Math.max(0, ...got.shots.map((shot) => shot.revision));
  const arrived = have.shots.filter((shot) => !asked.has(shot.id) && shot.revision > newest);
  return { shots: byNumber([...shots, ...arrived]) };
}

const byNumber = (shots: ShotWithTakes[]) =>
  shots.sort((a, b) => a.number.localeCompare(b.number, 'en', { numeric: true }));

/** Puts a shot's newer state into the sheet and its own cache; a shot nobody had yet joins the sheet. */
export function applyShot(client: QueryClient, slug: string, shot: Shot): void {
  client.setQueryData(shotOptions(slug, shot.number).queryKey, (have) => have && newerShot(have, shot));
  client.setQueryData(sheetOptions(slug).queryKey, (have) => {
    if (!have) return have;
    if (!have.shots.some((one) => one.id === shot.id))
      return { shots: byNumber([...have.shots, { ...shot, takes: [] }]) };
    return { shots: have.shots.map((one) => (one.id === shot.id ? newerShot(one, shot) : one)) };
  });
}

/** Puts a take's newer state into its row of the sheet and its shot; takes it out of any shot it moved away from. */
export function applyTakeToShots(client: QueryClient, slug: string, take: Take): void {
  const patch = (shot: ShotWithTakes): ShotWithTakes => {
    const known = shot.takes.find((one) => one.id === take.id);
    if (shot.number !== take.shotNumber) {
      return known && take.revision >= known.revision
        ? { ...shot, takes: shot.takes.filter((one) => one.id !== take.id) }
        : shot;
    }
    const takes = known
      ? shot.takes.map((one) => (one.id === take.id ? newerTake(one, take) : one))
      : [...shot.takes, take].sort((a, b) => a.number - b.number);
    return { ...shot, takes };
  };
  client.setQueriesData<ShotWithTakes>({ queryKey: [...productionKey(slug), 'shot'] }, (have) => have && patch(have));
  client.setQueryData(sheetOptions(slug).queryKey, (have) => have && { shots: have.shots.map(patch) });
}

/** Changes one take in every shot that shows it. */
export function patchTakeInShots(
  client: QueryClient,
  slug: string,
  takeId: string,
  change: (take: Take) => Take,
): void {
  const patch = (shot: ShotWithTakes): ShotWithTakes =>
    shot.takes.some((take) => take.id === takeId)
      ? { ...shot, takes: shot.takes.map((take) => (take.id === takeId ? change(take) : take)) }
      : shot;
  client.setQueriesData<ShotWithTakes>({ queryKey: [...productionKey(slug), 'shot'] }, (have) => have && patch(have));
  client.setQueryData(sheetOptions(slug).queryKey, (have) => have && { shots: have.shots.map(patch) });
}
