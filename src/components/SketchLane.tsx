import clsx from 'clsx';
import type { Sketch } from '../../shared/api/takes.ts';
import { laneOf, type SketchStep, sketchSteps } from '../lib/sketchSpacing.ts';

const WIDTH = 234;
const HEIGHT = 84;
const PAD = 4;

/** The lane of the score that carries a take's evidence, small: bars of the spacing and the blue line they should follow. */
export function SketchLane({ sketch, className }: { sketch: Sketch; className?: string }) {
  const lane = laneOf(sketch);
  const steps = sketchSteps(sketch, lane);
  const first = steps[0];
  const last = steps.at(-1);
  if (!first || !last) return null;

  const values = steps.flatMap((step) => (step.true === null ? [step.drawn] : [step.drawn, step.true]));
  const top = Math.max(0, ...values);
  const bottom = Math.min(0, ...values);
  const scale = (HEIGHT - 2 * PAD) / Math.max(1e-6, top - bottom);
  const zero = PAD + top * scale;
  const column = WIDTH / (last.frame - first.frame + last.shownFor);
  // A bar stands over the frames its drawing is shown on.
  const middle = (step: SketchStep) => (step.frame - first.frame + step.shownFor / 2) * column;
  const barWidth = (step: SketchStep) => Math.max(1, step.shownFor * column * 0.7);
  const words = lane === 'up' ? 'up and down, px a frame' : 'across, px a frame';

  return (
    <figure className={clsx('m-0 max-w-68', className)}>
      <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} className="block w-full" aria-hidden="true">
        <path d={`M0 ${zero}H${WIDTH}`} className="stroke-rule" strokeWidth="1" />
        {steps.map((step) => (
          <rect
            key={step.frame}
            x={middle(step) - barWidth(step) / 2}
            y={step.drawn > 0 ? zero - step.drawn * scale : zero}
            width={barWidth(step)}
            height={Math.max(0.6, Math.abs(step.drawn) * scale)}
            rx={Math.min(1.5, barWidth(step) / 4)}
            className={step.off ? 'fill-redline' : 'fill-bar'}
          />
        ))}
        {runs(steps).map((run) => (
          <path
            key={run[0]?.frame}
            d={`M${run.map((step) => `${middle(step)} ${zero - (step.true ?? 0) * scale}`).join('L')}`}
            fill="none"
            className="stroke-blueline"
            strokeWidth="1.8"
            strokeDasharray="6 4"
          />
        ))}
      </svg>
      <figcaption className="mt-1 text-sm text-graphite">{words}</figcaption>
    </figure>
  );
}

/** Passages with a true line; a new flight starts where the line jumps the other way. */
function runs<S extends { frame: number; true: number | null }>(steps: S[]): S[][] {
  const found: S[][] = [];
  let before: S | undefined;
  for (const step of steps) {
    if (step.true !== null) {
      const jumps = before?.true == null || (before.true < 0 && step.true > 0);
      if (jumps) found.push([step]);
      else found.at(-1)?.push(step);
    }
    before = step;
  }
  return found.filter((run) => run.length > 1);
}
