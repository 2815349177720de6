import { useMemo } from 'react';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import { type Badge, placeBadges } from './badges.ts';
import { FindingsLayer } from './FindingsLayer.tsx';
import type { Box } from './labels.ts';
import { LadderLayer, LitTick } from './LadderLayer.tsx';
import type { DrawnObject } from './layerProps.ts';
import { LitMark, MarksLayer } from './MarksLayer.tsx';
import { MendLayer } from './MendLayer.tsx';
import { LitNumber, NumbersLayer, type PlacedNumber, placeNumbers } from './NumbersLayer.tsx';
import type { PictureStageProps } from './PictureStage.tsx';
import { QuarterDropLayer } from './QuarterDropLayer.tsx';
import { StageGroup } from './StageGroup.tsx';
import { TrueArcLayer } from './TrueArcLayer.tsx';
import type { Size, View } from './view.ts';
import { WashLayer } from './WashLayer.tsx';

interface OverlayProps extends PictureStageProps {
  objects: readonly DrawnObject[];
  view: View;
  seen: Box;
  room: Size;
  /** The surround has room beside the picture. */
  beside: boolean;
}

const NO_BADGES: Badge[] = [];
const NO_NUMBERS: PlacedNumber[] = [];
const NO_MEND: NumberedFinding['mend'] = [];
const STILL = { moved: false, offsets: [] };
const LADDERS = ['across', 'up'] as const;
const RAIL_INSET = 10;
const RAIL_AWAY = 20;
const TICK_ROOM = 14;

function stageBounds(objects: readonly DrawnObject[], room: number): Box {
  const xs = objects.flatMap((object) => object.drawings.map((drawing) => drawing.x));
  const ys = objects.flatMap((object) => object.drawings.map((drawing) => drawing.y));
  const left = Math.min(...xs) - 2 * room;
  const top = Math.min(...ys) - room;
  return { left, top, width: Math.max(...xs) + 2 * room - left, height: Math.max(...ys) + room - top };
}

/** All layers in SVG and picture px: whatever the zoom, lines and words keep their size on the screen and stay sharp. */
export function Overlay(props: OverlayProps) {
  const {
    objects,
    findings,
    firstFrame,
    playhead,
    picture,
    layers,
    view,
    seen,
    room,
    mend,
    chosenFinding,
    objectId,
    beside,
  } = props;
  const unit = 1 / view.scale;
  const rails = useMemo(() => {
    const away = beside ? RAIL_AWAY : -RAIL_INSET;
    const x = Math.min(picture.width + (away + RAIL_INSET) * unit, seen.left + seen.width - 2.4 * RAIL_INSET * unit);
    const y = Math.min(picture.height + away * unit, seen.top + seen.height - 1.3 * RAIL_INSET * unit);
    return { x, y, clear: x > picture.width + TICK_ROOM * unit && y > picture.height + TICK_ROOM * unit };
  }, [picture, seen, unit, beside]);
  // Words stay on the picture or, zoomed in, on what is seen of it, and clear of a ladder that lies on it.
  const ladderOnPicture = layers.has('ladders') && !rails.clear;
  const moved = props.reading?.camera.moved ?? false;
  const bounds = useMemo(() => {
    // Under a camera that moves the stage is larger than any one picture.
    if (moved) return stageBounds(objects, 40 * unit);
    const left = Math.max(0, seen.left);
    const top = Math.max(0, seen.top);
    const right = Math.min(picture.width, seen.left + seen.width, ladderOnPicture ? rails.x - 12 * unit : Infinity);
    const bottom = Math.min(picture.height, seen.top + seen.height, ladderOnPicture ? rails.y - 8 * unit : Infinity);
    return { left, top, width: right - left, height: bottom - top };
  }, [picture, seen, ladderOnPicture, rails, unit, moved, objects]);
  const badges = useMemo(() => placeBadges(objects, findings, unit, bounds), [objects, findings, unit, bounds]);
  const hasFindings = layers.has('findings');
  const numbers = useMemo(
    () => placeNumbers({ objects, firstFrame, unit, bounds }, hasFindings ? badges : NO_BADGES),
    [objects, firstFrame, unit, bounds, hasFindings, badges],
  );
  const mended = findings.find((finding) => finding.id === mend);
  const measured = useMemo(() => objects.filter((object) => object.id === objectId), [objects, objectId]);
  const shared = { objects, findings, firstFrame, playhead, unit, bounds };
  const sheet = {
    width: room.width,
    height: room.height,
    viewBox: `${seen.left} ${seen.top} ${seen.width} ${seen.height}`,
    'aria-hidden': true,
  };
  const camera = props.reading?.camera ?? STILL;
  const stage = { camera, playhead };
  // What is lit lies on a sheet of its own, so that a step does not paint the rest again.
  return (
    <>
      <svg {...sheet} className="absolute inset-0 will-change-transform">
        <StageGroup {...stage}>
          {hasFindings && <WashLayer {...shared} chosen={chosenFinding} />}
          {layers.has('quarter') && <QuarterDropLayer {...shared} />}
          {layers.has('arc') && <TrueArcLayer {...shared} />}
        </StageGroup>
        {layers.has('ladders') &&
          LADDERS.map((along) => (
            <StageGroup key={along} {...stage} along={along}>
              <LadderLayer {...shared} objects={measured} along={along} rails={rails} withTrue={layers.has('arc')} />
            </StageGroup>
          ))}
        <StageGroup {...stage}>
          {layers.has('marks') && <MarksLayer {...shared} />}
          {hasFindings && (
            <FindingsLayer {...shared} badges={badges} chosen={chosenFinding} onChoose={props.onChooseFinding} />
          )}
          {/* The mend's own words want the room beside its arrow. */}
          {layers.has('numbers') && !mend && <NumbersLayer {...shared} numbers={numbers} />}
        </StageGroup>
      </svg>
      <svg {...sheet} className="pointer-events-none absolute inset-0 will-change-transform">
        {layers.has('ladders') &&
          LADDERS.map((along) => (
            <StageGroup key={along} {...stage} along={along}>
              <LitTick {...shared} objects={measured} along={along} rails={rails} />
            </StageGroup>
          ))}
        <StageGroup {...stage}>
          {mend && <MendLayer {...shared} finding={mend} />}
          {layers.has('marks') && <LitMark {...shared} />}
          {layers.has('numbers') && (
            <LitNumber
              {...shared}
              numbers={mend ? NO_NUMBERS : numbers}
              mend={mended?.mend ?? NO_MEND}
              taken={hasFindings ? badges : NO_BADGES}
            />
          )}
        </StageGroup>
      </svg>
    </>
  );
}
