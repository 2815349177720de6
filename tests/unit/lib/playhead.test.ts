import { describe, expect, it } from 'vitest';
import { createPlayhead } from '../../../src/lib/playhead.ts';

describe('the playhead', () => {
  it('stays on the strip at both ends', () => {
    const playhead = createPlayhead(25, 40);
    expect(playhead.frame()).toBe(25);
    playhead.step(1);
    expect(playhead.frame()).toBe(25);
    playhead.choose(-3);
    expect(playhead.frame()).toBe(1);
  });

  it('lights the frame pointed at and goes back to the chosen one', () => {
    const playhead = createPlayhead(25, 7);
    playhead.point(12);
    expect([playhead.frame(), playhead.lit()]).toEqual([7, 12]);
    playhead.point(null);
    expect(playhead.lit()).toBe(7);
  });

  it('stops pointing when a frame is chosen', () => {
    const playhead = createPlayhead(25, 7);
    playhead.point(12);
    playhead.step(1);
    expect([playhead.frame(), playhead.lit()]).toEqual([8, 8]);
  });

  it('tells only of changes, and nobody who left', () => {
    const playhead = createPlayhead(25);
    let told = 0;
    const leave = playhead.subscribe(() => told++);
    playhead.choose(1);
    playhead.point(null);
    expect(told).toBe(0);
    playhead.choose(2);
    playhead.setPlaying(true);
    playhead.setPlaying(true);
    expect(told).toBe(2);
    leave();
    playhead.choose(3);
    expect(told).toBe(2);
  });
});
