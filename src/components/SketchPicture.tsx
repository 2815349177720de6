import clsx from 'clsx';
import type { CSSProperties } from 'react';
import type { Sketch } from '../../shared/api/takes.ts';
import { type Region, sketchRegion } from '../lib/sketchRegion.ts';

export interface SketchPictureProps {
  sketch: Sketch;
  /** The picture under the drawing. */
  src: string;
  className?: string;
}

/**
 * A frame of the take, faded under the marks that were read on it, the true arc where one is missed, and the findings.
 * It fills its box and is cropped to it, but never so far that a mark is lost.
 */
export function SketchPicture({ sketch, src, className }: SketchPictureProps) {
  const { width, height } = sketch;
  return (
    <div className={clsx('@container-size overflow-hidden bg-surround', className)}>
      <div className="absolute bg-surround" style={placement(sketch, sketchRegion(sketch))}>
        <img src={src} alt="" loading="lazy" decoding="async" className="size-full" />
        <div className="absolute inset-0 bg-pencil-paper/50" />
        <svg viewBox={`0 0 ${width} ${height}`} className="absolute inset-0 size-full" aria-hidden="true">
          <SketchDrawing sketch={sketch} />
        </svg>
      </div>
    </div>
  );
}

/**
 * Fills the box when every mark stays in sight (`cover`), otherwise shows the whole region of the marks (`fit`); then lies
 * so that the region is in the middle, as far as the picture reaches.
 */
function placement({ width, height }: Sketch, region: Region): CSSProperties {
  const cover = `max(100cqw / ${width}, 100cqh / ${height})`;
  const fit = `min(100cqw / ${region.width}, 100cqh / ${region.height})`;
  const place = (box: string, length: number, middle: number) => {
    const slack = `(${box} - ${length} * var(--px))`;
    return `clamp(min(${slack}, ${slack} / 2), ${box} / 2 - ${middle} * var(--px), max(0px, ${slack} / 2))`;
  };
  return {
    '--px': `min(${cover}, ${fit})`,
    width: `calc(${width} * var(--px))`,
    height: `calc(${height} * var(--px))`,
    left: place('100cqw', width, region.x + region.width / 2),
    top: place('100cqh', height, region.y + region.height / 2),
  } as CSSProperties;
}

/** Strokes are px of the screen whatever the picture's size; a mark is a stroke of no length with round ends. */
function SketchDrawing({ sketch }: { sketch: Sketch }) {
  const { marks, arcs, findings } = sketch;
  const objects = [...new Set(marks.map((mark) => mark.object))];
  const inOrder = (object: string) => marks.filter((mark) => mark.object === object).sort((a, b) => a.frame - b.frame);
  const objectOf = (flight: string | null) => arcs.find((arc) => arc.flight === flight)?.object ?? objects[0] ?? '';

  return (
    <g fill="none" strokeLinejoin="round">
      {findings.length > 0 &&
        arcs.map((arc) => (
          <path
            key={`${arc.object}${arc.flight}`}
            d={through(arc.points)}
            vectorEffect="non-scaling-stroke"
            className="stroke-pencil-blueline"
            strokeWidth="2"
            strokeDasharray="6 5"
          />
        ))}
      {findings.map((finding) => (
        <path
          key={finding.id}
          d={through(
            inOrder(objectOf(finding.flight)).filter(
              ({ frame }) => frame >= finding.fromFrame && frame <= finding.toFrame,
            ),
          )}
          vectorEffect="non-scaling-stroke"
          className="stroke-pencil-redline"
          strokeWidth="13"
          strokeLinecap="round"
          opacity={findings.length > 1 ? 0.15 : 0.2}
        />
      ))}
      {objects.map((object) => (
        <g key={object} className="stroke-pencil-ink">
          <path d={through(inOrder(object))} vectorEffect="non-scaling-stroke" strokeWidth="1" opacity="0.5" />
          <path
            d={inOrder(object)
              .map((mark) => `M${mark.x.toFixed(1)} ${mark.y.toFixed(1)}h0`)
              .join('')}
            vectorEffect="non-scaling-stroke"
            strokeWidth="7"
            strokeLinecap="round"
          />
        </g>
      ))}
    </g>
  );
}

function through(points: { x: number; y: number }[]): string {
  const path = points.map((point) => `${point.x.toFixed(1)} ${point.y.toFixed(1)}`);
  // A lone point still shows: a line of no length with round ends.
  if (path.length === 1) return `M${path[0]}h0`;
  return path.length > 1 ? `M${path.join('L')}` : '';
}
