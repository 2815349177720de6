import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { pino } from 'pino';
import type { DataSource } from 'typeorm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type AnalysisPool, createAnalysisPool } from '../../server/analysis/pool.ts';
import { createDataSource } from '../../server/data-source.ts';
import { Production } from '../../server/entities/Production.ts';
import { ProductionEvent } from '../../server/entities/ProductionEvent.ts';
import { Reading } from '../../server/entities/Reading.ts';
import { Take } from '../../server/entities/Take.ts';
import { User } from '../../server/entities/User.ts';
import { DEMO_PEOPLE } from '../../server/scripts/demo/people.ts';
import { hashPassword } from '../../server/services/session.service.ts';
import { EVENTS_OF_STORY, type SeedDeps, seedDemo } from '../../server/scripts/demo/seed.ts';
import { DEMO_STRIPS, type DemoStripId } from '../../server/scripts/demo/strips.ts';
import { createTestDatabase, type TestDatabase } from '../support/testDatabase.ts';

let analysis: AnalysisPool;
let dataDir: string;
let dataSource: DataSource;
let deps: SeedDeps;
let database: TestDatabase;

beforeAll(async () => {
  database = await createTestDatabase();
  dataSource = await createDataSource(database).initialize();
  await dataSource.runMigrations();
  analysis = createAnalysisPool();
  dataDir = await mkdtemp(path.join(tmpdir(), 'spandrel-demo-'));
  deps = { dataSource, dataDir, analysis, log: pino({ level: 'silent' }) };
});

afterAll(async () => {
  await analysis?.close();
  await dataSource?.destroy();
  await database?.drop();
  await rm(dataDir, { recursive: true, force: true });
});

const strips = Object.entries(DEMO_STRIPS) as [DemoStripId, (typeof DEMO_STRIPS)[DemoStripId]][];

describe('the demo production in an empty database', () => {
  beforeAll(async () => {
    // A run that is broken off: its people are there and no strip can be drawn.
    await writeFile(path.join(dataDir, 'demo-drawings'), '');
    await expect(seedDemo(deps)).rejects.toThrow();
    expect(await dataSource.manager.count(Production)).toBe(1);
    await seedDemo(deps);
  }, 180_000);

  it('starts again after a run that was broken off, and leaves one production', async () => {
    expect(await dataSource.manager.count(Production)).toBe(1);
    expect(await dataSource.manager.count(User)).toBe(Object.keys(DEMO_PEOPLE).length);
    expect(await readdir(path.join(dataDir, 'takes'))).toHaveLength(strips.length);
    expect(await readdir(dataDir)).toEqual(['takes']);
  });

  it('numbers its events without gaps, in the order of their times', async () => {
    const events = await dataSource.manager.find(ProductionEvent, { order: { seq: 'ASC' } });
    expect(events.map(({ seq }) => seq)).toEqual(Array.from({ length: EVENTS_OF_STORY }, (_, index) => index + 1));
    const times = events.map(({ at }) => at.getTime());
    expect(times).toEqual([...times].sort((a, b) => a - b));
    expect(times.at(-1)! - times[0]!).toBeGreaterThan(8 * 24 * 3_600_000);
  });

  it.each(strips)('has %s read as what it was drawn to be', async (id, strip) => {
    const [number, take] = id.split('/');
    const reading = await dataSource.manager.findOneOrFail(Reading, {
      where: { take: { number: Number(take), shot: { number: number! } } },
    });
    expect(reading.sketch.findings.map(({ kind }) => kind)).toEqual(strip.fault === null ? [] : [strip.fault]);
    expect(reading.sketch.outcome).toBe('read');
  });

  it('has takes in every state', async () => {
    const takes = await dataSource.manager.find(Take);
    const count = (review: string) => takes.filter((take) => take.review === review).length;
    expect({
      waiting: count('waiting'),
      anotherPass: count('another-pass'),
      cleared: count('cleared'),
      waived: count('waived'),
    }).toEqual({ waiting: 5, anotherPass: 7, cleared: 4, waived: 1 });
  });

  it('answers the sign-ins and leaves a database with people in it alone', async () => {
    const before = await dataSource.manager.count(ProductionEvent);
    const signIns = await seedDemo(deps);
    expect(signIns.map(({ role }) => role).sort()).toEqual(
      Object.values(DEMO_PEOPLE)
        .map(({ role }) => role)
        .sort(),
    );
    expect(await dataSource.manager.count(ProductionEvent)).toBe(before);
  });

  it('prints no sign-in whose password was changed', async () => {
    await dataSource.manager.update(
      User,
      { email: DEMO_PEOPLE.pim.email },
      { passwordHash: await hashPassword('mine') },
    );
    expect((await seedDemo(deps)).map(({ email }) => email)).not.toContain(DEMO_PEOPLE.pim.email);
  });
});
