import type { Sketch } from '../../shared/api/takes.ts';

export interface SketchPictureProps {
  sketch: Sketch;
  /** The picture under the drawing. */
  src: string;
  className?: string;
}

/** How wide a card draws the picture, px: sizes of marks are chosen for it. */
const DRAWN_AT = 640;

/** A frame of the take, faded under the marks that were read on it, the true arc where one is missed, and the findings. */
export function SketchPicture({ sketch, src, className }: SketchPictureProps) {
  const { width, height, marks, arcs, findings } = sketch;
  const unit = width / DRAWN_AT;
  const objects = [...new Set(marks.map((mark) => mark.object))];
  const inOrder = (object: string) => marks.filter((mark) => mark.object === object).sort((a, b) => a.frame - b.frame);

  return (
    <div className={className}>
      <div
        className="relative mx-auto max-h-full max-w-full overflow-hidden bg-pencil-paper"
        style={{ aspectRatio: `${width} / ${height}` }}
      >
        <img src={src} alt="" loading="lazy" decoding="async" className="size-full opacity-50" />
        <svg viewBox={`0 0 ${width} ${height}`} className="absolute inset-0 size-full" aria-hidden="true">
          {findings.length > 0 &&
            arcs.map((arc) => (
              <path
                key={`${arc.object}${arc.flight}`}
                d={through(arc.points)}
                fill="none"
                className="stroke-pencil-blueline"
                strokeWidth={2 * unit}
                strokeDasharray={`${6 * unit} ${5 * unit}`}
              />
            ))}
          {findings.map((finding) => (
            <path
              key={finding.id}
              d={through(
                inOrder(objectOf(sketch, finding.flight) ?? objects[0] ?? '').filter(
                  (mark) => mark.frame >= finding.fromFrame && mark.frame <= finding.toFrame,
                ),
              )}
              fill="none"
              className="stroke-pencil-redline"
              strokeWidth={13 * unit}
              strokeLinecap="round"
              strokeLinejoin="round"
              opacity={findings.length > 1 ? 0.14 : 0.2}
            />
          ))}
          {objects.map((object) => (
            <g key={object}>
              <path
                d={through(inOrder(object))}
                fill="none"
                className="stroke-pencil-ink"
                strokeWidth={unit}
                opacity="0.5"
              />
              {inOrder(object).map((mark) => (
                <circle key={mark.frame} cx={mark.x} cy={mark.y} r={3.6 * unit} className="fill-pencil-ink" />
              ))}
            </g>
          ))}
        </svg>
      </div>
    </div>
  );
}

function objectOf(sketch: Sketch, flight: string | null): string | undefined {
  return sketch.arcs.find((arc) => arc.flight === flight)?.object;
}

function through(points: { x: number; y: number }[]): string {
  const path = points.map((point) => `${point.x.toFixed(1)} ${point.y.toFixed(1)}`);
  // A lone point still shows: a line of no length with round ends.
  return path.length === 1 ? `M${path[0]}L${path[0]}` : path.length > 1 ? `M${path.join('L')}` : '';
}
