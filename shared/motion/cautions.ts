import { isRepeat } from './scatter.ts';
import type { TrackView } from './view.ts';
import { shownAt } from './view.ts';

const FEW_DRAWINGS = 7;

/** What is no fault but should be known, in plain sentences. */
export function cautionsOf(view: TrackView): string[] {
  const { account, id, field } = view;
  const out: string[] = [];
  if (account.depth) {
    out.push(`${id} moves towards or away from the camera; that is taken out and not called a fault.`);
  }
  if (view.light) out.push(`${id} is a light thing that air slows: its gravity is not judged, its shape is.`);
  if (isSlowedAcross(view)) out.push(`${id} slows across, as air slows a light thing; that is not called a fault.`);
  const stray = account.left.filter((i) => !isRepeat(view, i));
  if (stray.length > Math.max(3, field.drawings.length / 6)) {
    out.push(`${stray.length} drawings of ${id} follow no one arc; look at its marks before trusting this reading.`);
  }
  for (const flight of view.flights) {
    const count = field.drawings.filter((one) => one.t >= flight.start && one.t <= flight.end).length;
    if (count < FEW_DRAWINGS) {
      out.push(`Flight ${flight.id} has only ${count} drawings; small faults cannot be told from noise in it.`);
    }
    if (!flight.judged) out.push(`Flight ${flight.id} is marked as no free flight and is not judged.`);
  }
  const first = view.flights[0];
  const last = view.flights[view.flights.length - 1];
  if (first && !first.opens)
    out.push(`${id} is in the air from the first drawing on; its take-off is not in the strip.`);
  if (last && !last.closes) {
    out.push(`${id} is still in the air at frame ${shownAt(view, last.end)}; its landing is not in the strip.`);
  }
  return out;
}

/** Whether a thing that air may slow loses speed across; a thing of the stage would be called uneven. */
function isSlowedAcross(view: TrackView): boolean {
  const { fault, fit } = view.account;
  return view.field.airy && fault?.kind === 'shape' && fault.name === 'ease' && fit.theta[fit.path.shapeAt]! < 0;
}
