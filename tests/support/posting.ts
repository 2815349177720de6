import type { Draft } from '../../shared/api/drafts.ts';
import type { Client } from './client.ts';
import { drawTossFrame, type TossDrawing } from './pictures.ts';

/** A file as someone drags it in. */
export interface Dragged {
  name: string;
  bytes: Buffer;
}

/** The frames of a drawn toss as files, numbered from `firstFrame`. */
export async function dragToss(drawing: TossDrawing, nameOf = (n: number) => `toss.${n}.png`): Promise<Dragged[]> {
  const first = drawing.firstFrame ?? 1001;
  return Promise.all(
    Array.from({ length: drawing.frames }, async (_, index) => ({
      name: nameOf(first + index),
      bytes: await drawTossFrame(index + 1, drawing),
    })),
  );
}

export async function startDraft(client: Client, slug: string): Promise<Draft> {
  return (await client.post(`/productions/${slug}/drafts`).expect(201)).body;
}

/** Sends files in batches of sixteen, as the page does, and answers with the draft after the last. */
export async function addPictures(client: Client, draftId: string, files: Dragged[]): Promise<Draft> {
  let draft: Draft | undefined;
  for (let from = 0; from < files.length; from += 16) {
    const request = client.request('post', `/drafts/${draftId}/pictures`);
    for (const { name, bytes } of files.slice(from, from + 16)) request.attach('pictures', bytes, name);
    const answer = await request;
    if (answer.status !== 200) throw new Error(`${answer.status} ${JSON.stringify(answer.body)}`);
    draft = answer.body;
  }
  return draft!;
}
