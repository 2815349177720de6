import { watch } from 'node:fs';
import { readdir } from 'node:fs/promises';
import { request } from 'node:http';
import path from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { signIn } from '../support/client.ts';
import { buildMember } from '../support/factories.ts';
import { addPictures, dragToss, startDraft } from '../support/posting.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
beforeAll(async () => {
  server = await createTestServer();
});
afterAll(() => server.remove());

/** Resolves when the names in a folder satisfy a wish, looking again at every change of the folder. */
async function untilFolder(folder: string, wish: (names: string[]) => boolean): Promise<void> {
  const watcher = watch(folder);
  try {
    await new Promise<void>((resolve, reject) => {
      const look = () => readdir(folder).then((names) => wish(names) && resolve(), reject);
      watcher.on('change', look);
      void look();
    });
  } finally {
    watcher.close();
  }
}

test('a line that breaks in the middle of a picture costs that batch and nothing else', async () => {
  const { user, production } = await buildMember(server.deps);
  const client = await signIn(server, user);
  const draft = await startDraft(client, production.slug);
  const filled = await addPictures(client, draft.id, await dragToss({ frames: 3 }));
  const folder = path.join(server.dataDir, 'drafts', draft.id);
  const before = (await readdir(folder)).sort();

  const upload = request(`${server.url}/api/drafts/${draft.id}/pictures`, {
    method: 'POST',
    headers: {
      Cookie: client.cookie(),
      Origin: server.url,
      'Content-Type': 'multipart/form-data; boundary=cut',
      'Content-Length': '5000000',
    },
  });
  upload.on('error', () => {});
  upload.write('--cut\r\nContent-Disposition: form-data; name="pictures"; filename="toss.1004.png"\r\n\r\n');
  upload.write(Buffer.alloc(200_000, 7));
  await untilFolder(folder, (names) => names.some((name) => name.startsWith('in-')));
  upload.destroy();
  await untilFolder(folder, (names) => !names.some((name) => name.startsWith('in-')));

  expect((await readdir(folder)).sort()).toEqual(before);
  expect((await client.get(`/drafts/${draft.id}`).expect(200)).body).toEqual(filled);
  const again = await addPictures(client, draft.id, await dragToss({ frames: 4 }));
  expect(again.pictures).toHaveLength(4);
});
