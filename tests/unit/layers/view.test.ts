import { describe, expect, it } from 'vitest';
import { fitView, holdView, MAX_SCALE, panBy, panToSee, zoomAbout } from '../../../src/features/layers/view.ts';

const picture = { width: 960, height: 540 };
const room = { width: 1000, height: 360 };

describe('what is seen of the picture', () => {
  it('fits the whole picture into the middle of its room', () => {
    const view = fitView(picture, room);
    expect(view.scale).toBeCloseTo(360 / 540, 12);
    expect(view.y).toBeCloseTo(0, 12);
    expect((0 - view.x) * view.scale).toBeCloseTo((1000 - 640) / 2, 9);
  });

  it('leaves the margins free', () => {
    const view = fitView(picture, room, { top: 0, right: 0, bottom: 30, left: 0 });
    expect((540 - view.y) * view.scale).toBeCloseTo(330, 9);
  });

  it('keeps the point under the hand while zooming', () => {
    const view = fitView(picture, room);
    const at = { x: 300, y: 120 };
    const under = { x: view.x + at.x / view.scale, y: view.y + at.y / view.scale };
    const closer = zoomAbout(view, 2.5, at, view.scale);
    expect(closer.x + at.x / closer.scale).toBeCloseTo(under.x, 9);
    expect(closer.y + at.y / closer.scale).toBeCloseTo(under.y, 9);
  });

  it('never zooms further out than the fit, nor closer than a grid of pixels', () => {
    const view = fitView(picture, room);
    expect(zoomAbout(view, 0.1, { x: 0, y: 0 }, view.scale).scale).toBe(view.scale);
    expect(zoomAbout(view, 1e6, { x: 0, y: 0 }, view.scale).scale).toBe(MAX_SCALE);
  });

  it('shows no gap beside a picture larger than its room, and keeps a smaller one in the middle', () => {
    const closer = zoomAbout(fitView(picture, room), 4, { x: 500, y: 180 }, 0.1);
    const held = holdView(panBy(closer, 9999, 9999), picture, room);
    expect([held.x, held.y]).toEqual([0, 0]);
    const fitted = holdView(panBy(fitView(picture, room), 500, 0), picture, room);
    expect((0 - fitted.x) * fitted.scale).toBeCloseTo(180, 9);
  });

  it('moves the picture with the hand', () => {
    const view = { x: 10, y: 20, scale: 2 };
    expect(panBy(view, 6, -4)).toEqual({ x: 7, y: 22, scale: 2 });
  });

  it('moves to a thing only when it comes near the edge or leaves', () => {
    const view = { x: 0, y: 0, scale: 2 };
    expect(panToSee(view, room, { x: 250, y: 90 })).toBeNull();
    expect(panToSee(view, room, { x: 495, y: 90 })).toEqual({ x: 500 - 990, y: 0 });
    const by = panToSee(view, room, { x: 900, y: 500 })!;
    const after = panBy(view, by.x, by.y);
    expect(panToSee(after, room, { x: 900, y: 500 })).toBeNull();
  });
});
