import { useMemo } from 'react';
import { FindingsLayer } from './FindingsLayer.tsx';
import type { Box } from './labels.ts';
import { LaddersLayer, LitTicks } from './LaddersLayer.tsx';
import type { DrawnObject } from './layerProps.ts';
import { LitMark, MarksLayer } from './MarksLayer.tsx';
import { MendLayer } from './MendLayer.tsx';
import { LitNumber, NumbersLayer } from './NumbersLayer.tsx';
import type { PictureStageProps } from './PictureStage.tsx';
import { QuarterDropLayer } from './QuarterDropLayer.tsx';
import { TrueArcLayer } from './TrueArcLayer.tsx';
import type { Size, View } from './view.ts';

interface OverlayProps extends PictureStageProps {
  objects: readonly DrawnObject[];
  view: View;
  seen: Box;
  room: Size;
  /** The surround has room beside the picture. */
  beside: boolean;
}

const RAIL_INSET = 10;
const RAIL_AWAY = 20;

/** All layers as one SVG in picture px: whatever the zoom, lines and words keep their size on the screen and stay sharp. */
export function Overlay(props: OverlayProps) {
  const { objects, findings, firstFrame, playhead, picture, layers, view, seen, room, mend, chosenFinding, beside } =
    props;
  const unit = 1 / view.scale;
  const rails = useMemo(() => {
    const away = beside ? RAIL_AWAY : -RAIL_INSET;
    return {
      x: Math.min(picture.width + away * unit, seen.left + seen.width - RAIL_INSET * unit),
      y: Math.min(picture.height + away * unit, seen.top + seen.height - RAIL_INSET * unit),
    };
  }, [picture, seen, unit, beside]);
  // Words stay on the picture or, zoomed in, on what is seen of it.
  const bounds = useMemo(() => {
    const left = Math.max(0, seen.left);
    const top = Math.max(0, seen.top);
    return {
      left,
      top,
      width: Math.min(picture.width, seen.left + seen.width) - left,
      height: Math.min(picture.height, seen.top + seen.height) - top,
    };
  }, [picture, seen]);
  const shared = { objects, findings, firstFrame, playhead, unit, bounds };
  return (
    <svg
      className="absolute inset-0"
      width={room.width}
      height={room.height}
      viewBox={`${seen.left} ${seen.top} ${seen.width} ${seen.height}`}
      aria-hidden="true"
    >
      {layers.has('quarter') && <QuarterDropLayer {...shared} />}
      {layers.has('arc') && <TrueArcLayer {...shared} />}
      {layers.has('ladders') && <LaddersLayer {...shared} rails={rails} withTrue={layers.has('arc')} />}
      {layers.has('marks') && <MarksLayer {...shared} />}
      {layers.has('ladders') && <LitTicks {...shared} rails={rails} />}
      {layers.has('findings') && <FindingsLayer {...shared} chosen={chosenFinding} onChoose={props.onChooseFinding} />}
      {mend && <MendLayer {...shared} finding={mend} />}
      {layers.has('marks') && <LitMark {...shared} />}
      {layers.has('numbers') && <NumbersLayer {...shared} />}
      {layers.has('numbers') && <LitNumber {...shared} />}
    </svg>
  );
}
