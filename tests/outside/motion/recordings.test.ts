import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readMotion } from '../../../shared/motion/read.ts';
import type { Mark } from '../../../shared/reading/document.ts';
import { readMarks } from '../../unit/motion/factories.ts';

const SHELF = new URL('../../../../shared/footage/real/', import.meta.url);
const here = existsSync(SHELF);
const lines = (path: string) => readFileSync(new URL(path, SHELF), 'utf8').trim().split('\n');
const TIMING = ['apex-off-centre', 'too-straight', 'hang', 'across-uneven', 'spacing-off-path'];

describe.skipIf(!here)('eleven kinds of ball dropped from a bridge (B. de Silva and others 2020, MIT)', () => {
  const PX_PER_METRE = 20;
  const drops = new Map<string, Mark[]>();
  if (here) {
    const rows = lines('falling-balls-bridge/drops.csv')
      .slice(1)
      .map((line) => line.split(','));
    for (const [ball, drop, seconds, height] of rows) {
      const key = `${ball} ${drop}`;
      const marks = drops.get(key) ?? [];
      marks.push({
        frame: Math.round(Number(seconds) * 15) + 1,
        x: 300,
        y: 1100 - Number(height) * PX_PER_METRE,
        origin: 'import',
      });
      drops.set(key, marks);
    }
  }
  const heavy = ['Bowling Ball', 'Baseball', 'Golf Ball'];
  const read = (marks: Mark[], light: boolean) =>
    readMarks(marks, { fps: { num: 15, den: 1 }, scale: { pxPerMetre: PX_PER_METRE }, width: 0, height: 0 }, { light });

  it('the heavy ones are true, at Earth gravity within 7 %', () => {
    for (const [key, marks] of drops) {
      if (!heavy.some((ball) => key.startsWith(ball))) continue;
      const reading = read(marks, false);
      expect([key, reading.findings.map((finding) => finding.kind)]).toEqual([key, []]);
      expect(Math.abs(reading.objects[0]!.flights[0]!.gravity.metric!.value / 9.8 - 1)).toBeLessThan(0.07);
    }
  });

  it('the light ones are named as slowed by air, never as a timing fault', () => {
    for (const [key, marks] of drops) {
      if (heavy.some((ball) => key.startsWith(ball))) continue;
      const reading = read(marks, true);
      const timing = reading.findings.filter(
        (finding) => TIMING.includes(finding.kind) || finding.kind.startsWith('gravity'),
      );
      expect([key, timing]).toEqual([key, []]);
      expect(reading.cautions.join(' ')).toContain('air');
    }
  });
});

describe.skipIf(!here)('one ball thrown before a phone (G. Di Pasquale 2020, MIT)', () => {
  it('is one flight at Earth gravity within 5 %, without a finding that shows', () => {
    const marks = lines('thrown-ball-phone-video/throw.csv')
      .slice(1)
      .map((line) => line.split(',').map(Number))
      .map(([frame, x, y]): Mark => ({ frame: frame!, x: x!, y: y!, origin: 'import' }));
    // Scale: 12 cm are 23.37 px, heights 4 % more (the folder's source page).
    const reading = readMarks(marks, {
      fps: { num: 60, den: 1 },
      scale: { pxPerMetre: (1.02 * 23.37) / 0.12 },
      width: 1920,
      height: 1080,
    });
    expect(reading.objects[0]!.flights).toHaveLength(1);
    expect(Math.abs(reading.objects[0]!.flights[0]!.gravity.metric!.value / 9.6 - 1)).toBeLessThan(0.06);
    expect(reading.findings).toEqual([]);
  });
});

describe.skipIf(!here)('a real ball thrown and bouncing, 24 views (J. Jugglebot motion capture, MIT)', () => {
  it('has no finding that shows', () => {
    const shown = lines('mocap-throws/projected-tracks-input.jsonl').flatMap((line) => {
      const track = JSON.parse(line) as { id: string; fps: number; width: number; height: number; marks: Mark[] };
      const reading = readMotion({
        kind: 'marks',
        frames: Math.max(...track.marks.map((mark) => mark.frame)),
        width: track.width,
        height: track.height,
        firstFrame: 1,
        fps: { num: track.fps, den: 1 },
        hold: 1,
        tracks: [{ id: 'A', marks: track.marks.map((mark) => ({ ...mark, origin: 'import' })) }],
      });
      return reading.findings
        .filter((finding) => finding.severity !== 'minor')
        .map((finding) => [track.id, finding.kind]);
    });
    expect(shown).toEqual([]);
  });
});
