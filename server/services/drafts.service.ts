import { randomUUID } from 'node:crypto';
import { mkdir, rm } from 'node:fs/promises';
import path from 'node:path';
import type { EntityManager } from 'typeorm';
import type { Draft as WireDraft } from '../../shared/api/drafts.ts';
import { type Grid, gridCells } from '../../shared/finding/grid.ts';
import { Draft } from '../entities/Draft.ts';
import { DraftPicture } from '../entities/DraftPicture.ts';
import type { Deps } from '../deps.ts';
import { AppError, notFound } from '../errors.ts';
import { presentDraft } from '../presenters/drafts.presenter.ts';
import { draftFolder, thumbnailName } from '../storage/folders.ts';
import { accessByDraft, accessBySlug, allow } from './access.ts';
import { changeDraft, draftClosed } from './changeDraft.ts';
import { viewDraft } from './draftView.ts';
import { proposeGrid } from './proposeGrid.ts';

/** Starts a post. Nobody else sees it until it is posted. */
export async function startDraft(deps: Deps, userId: string, slug: string): Promise<WireDraft> {
  const { manager } = deps.dataSource;
  const { actor, production } = await accessBySlug(manager, userId, slug);
  allow(actor, 'take:post');
  const id = randomUUID();
  await mkdir(draftFolder(deps.dataDir, id), { recursive: true, mode: 0o700 });
  const draft = { id, productionId: production.id, userId, status: 'open', grid: null, refused: [] } as const;
  await manager.insert(Draft, { ...draft, refused: [], touchedAt: deps.now() });
  return showDraft(manager, id);
}

/** A post that is being put together. */
export async function readDraft(deps: Deps, userId: string, draftId: string): Promise<WireDraft> {
  const { draft } = await openDraft(deps, userId, draftId);
  return showDraft(deps.dataSource.manager, draft.id);
}

/** Takes a picture out of the post, or the word about one that was refused. */
export async function removePicture(deps: Deps, userId: string, draftId: string, name: string): Promise<WireDraft> {
  await openDraft(deps, userId, draftId);
  const removed = await changeDraft(deps, draftId, async (manager, draft) => {
    const picture = await manager.findOneBy(DraftPicture, { draftId, name });
    const refused = draft.refused.filter((file) => file.name !== name);
    if (!picture && refused.length === draft.refused.length) throw notFound('picture in this post');
    await manager.delete(DraftPicture, { draftId, name });
    await manager.update(Draft, { id: draftId }, { refused });
    return picture;
  });
  if (removed) await removePictureFiles(deps, draftId, removed);
  await proposeGrid(deps, draftId);
  return showDraft(deps.dataSource.manager, draftId);
}

/** Corrects how a strip picture is cut into frames; null: it is a frame, not a strip. */
export async function cutStrip(deps: Deps, userId: string, draftId: string, grid: Grid | null): Promise<WireDraft> {
  await openDraft(deps, userId, draftId);
  await changeDraft(deps, draftId, async (manager) => {
    const [picture, another] = await manager.findBy(DraftPicture, { draftId });
    if (!picture || another) throw new AppError('conflict', 'Only a single picture can be cut into frames.');
    if (grid) refuseOutside(grid, picture);
    await manager.update(Draft, { id: draftId }, { grid });
  });
  return showDraft(deps.dataSource.manager, draftId);
}

/** Throws a post away. */
export async function discardDraft(deps: Deps, userId: string, draftId: string): Promise<void> {
  await openDraft(deps, userId, draftId);
  await deps.dataSource.manager.delete(Draft, { id: draftId });
  await rm(draftFolder(deps.dataDir, draftId), { recursive: true, force: true });
}

/** A draft of one's own that is still open. @throws {AppError} `draft_closed` when it was posted */
export async function openDraft(deps: Deps, userId: string, draftId: string) {
  const access = await accessByDraft(deps.dataSource.manager, userId, draftId);
  allow(access.actor, 'take:post');
  if (access.draft.status !== 'open') throw draftClosed();
  return access;
}

/** A draft as it goes over the wire. */
export async function showDraft(manager: EntityManager, draftId: string): Promise<WireDraft> {
  const draft = await manager.findOneByOrFail(Draft, { id: draftId });
  return presentDraft(viewDraft(draft, await manager.findBy(DraftPicture, { draftId })));
}

/** Removes a picture and its thumbnail from disk; what is gone already is no error. */
export async function removePictureFiles(deps: Deps, draftId: string, picture: DraftPicture): Promise<void> {
  const folder = draftFolder(deps.dataDir, draftId);
  for (const file of [picture.file, thumbnailName(picture.file)]) await rm(path.join(folder, file), { force: true });
}

function refuseOutside(grid: Grid, picture: DraftPicture): void {
  const inside = gridCells(grid).every(
    ({ left, top, width, height }) => left + width <= picture.width && top + height <= picture.height,
  );
  if (inside) return;
  const message = `This cut reaches past the picture, which is ${picture.width} × ${picture.height} px.`;
  throw new AppError('invalid_request', message, { fields: [{ path: 'grid', message }] });
}
