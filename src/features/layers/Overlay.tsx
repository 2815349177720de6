import { useMemo } from 'react';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import { type Badge, placeBadges } from './badges.ts';
import { FindingsLayer } from './FindingsLayer.tsx';
import type { Box } from './labels.ts';
import { LaddersLayer, LitTicks } from './LaddersLayer.tsx';
import type { DrawnObject } from './layerProps.ts';
import { LitMark, MarksLayer } from './MarksLayer.tsx';
import { MendLayer } from './MendLayer.tsx';
import { LitNumber, NumbersLayer, placeNumbers } from './NumbersLayer.tsx';
import type { PictureStageProps } from './PictureStage.tsx';
import { QuarterDropLayer } from './QuarterDropLayer.tsx';
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
const NO_MEND: NumberedFinding['mend'] = [];
const RAIL_INSET = 10;
const RAIL_AWAY = 20;
const TICK_ROOM = 14;

/** All layers in SVG and picture px: whatever the zoom, lines and words keep their size on the screen and stay sharp. */
export function Overlay(props: OverlayProps) {
  const { objects, findings, firstFrame, playhead, picture, layers, view, seen, room, mend, chosenFinding, beside } =
    props;
  const unit = 1 / view.scale;
  const rails = useMemo(() => {
    const away = beside ? RAIL_AWAY : -RAIL_INSET;
    const x = Math.min(picture.width + (away + RAIL_INSET) * unit, seen.left + seen.width - 2.4 * RAIL_INSET * unit);
    const y = Math.min(picture.height + away * unit, seen.top + seen.height - 1.3 * RAIL_INSET * unit);
    return { x, y, clear: x > picture.width + TICK_ROOM * unit && y > picture.height + TICK_ROOM * unit };
  }, [picture, seen, unit, beside]);
  // Words stay on the picture or, zoomed in, on what is seen of it, and clear of a ladder that lies on it.
  const ladderOnPicture = layers.has('ladders') && !rails.clear;
  const bounds = useMemo(() => {
    const left = Math.max(0, seen.left);
    const top = Math.max(0, seen.top);
    const right = Math.min(picture.width, seen.left + seen.width, ladderOnPicture ? rails.x - 12 * unit : Infinity);
    const bottom = Math.min(picture.height, seen.top + seen.height, ladderOnPicture ? rails.y - 8 * unit : Infinity);
    return { left, top, width: right - left, height: bottom - top };
  }, [picture, seen, ladderOnPicture, rails, unit]);
  const badges = useMemo(() => placeBadges(objects, findings, unit, bounds), [objects, findings, unit, bounds]);
  const hasFindings = layers.has('findings');
  const numbers = useMemo(
    () => placeNumbers({ objects, firstFrame, unit, bounds }, hasFindings ? badges : NO_BADGES),
    [objects, firstFrame, unit, bounds, hasFindings, badges],
  );
  const mended = findings.find((finding) => finding.id === mend);
  const shared = { objects, findings, firstFrame, playhead, unit, bounds };
  const sheet = {
    width: room.width,
    height: room.height,
    viewBox: `${seen.left} ${seen.top} ${seen.width} ${seen.height}`,
    'aria-hidden': true,
  };
  // What is lit lies on a sheet of its own, so that a step does not paint the rest again.
  return (
    <>
      <svg {...sheet} className="absolute inset-0 will-change-transform">
        {hasFindings && <WashLayer {...shared} chosen={chosenFinding} />}
        {layers.has('quarter') && <QuarterDropLayer {...shared} />}
        {layers.has('arc') && <TrueArcLayer {...shared} />}
        {layers.has('ladders') && <LaddersLayer {...shared} rails={rails} withTrue={layers.has('arc')} />}
        {layers.has('marks') && <MarksLayer {...shared} />}
        {hasFindings && (
          <FindingsLayer {...shared} badges={badges} chosen={chosenFinding} onChoose={props.onChooseFinding} />
        )}
        {layers.has('numbers') && <NumbersLayer {...shared} numbers={numbers} />}
      </svg>
      <svg {...sheet} className="pointer-events-none absolute inset-0 will-change-transform">
        {layers.has('ladders') && <LitTicks {...shared} rails={rails} />}
        {mend && <MendLayer {...shared} finding={mend} />}
        {layers.has('marks') && <LitMark {...shared} />}
        {layers.has('numbers') && <LitNumber {...shared} numbers={numbers} mend={mended?.mend ?? NO_MEND} />}
      </svg>
    </>
  );
}
