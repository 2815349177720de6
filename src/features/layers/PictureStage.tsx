import { type CSSProperties, type ReactNode, useMemo, useRef } from 'react';
import type { Reading } from '../../../shared/reading/document.ts';
import { drawingOn, drawingsOf } from '../../lib/drawings.ts';
import { useKeys } from '../../lib/keys.ts';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import type { Playhead } from '../../lib/playhead.ts';
import { cameraAt, toPicture } from '../../lib/stage.ts';
import { useMediaQuery } from '../../lib/useMediaQuery.ts';
import { useSize } from '../../lib/useSize.ts';
import { FramePicture } from './FramePicture.tsx';
import type { Box } from './labels.ts';
import type { Layer } from './layerChoice.ts';
import type { DrawnObject } from './layerProps.ts';
import { Overlay } from './Overlay.tsx';
import { useFollowThing } from './useFollowThing.ts';
import { useHand } from './useHand.ts';
import { useView } from './useView.ts';
import { ZoomControls } from './ZoomControls.tsx';

export interface PictureStageProps {
  takeId: string;
  firstFrame: number;
  picture: { width: number; height: number };
  /** With its points on the stage. Null while there is none: the bare picture is shown. */
  reading: Reading | null;
  findings: readonly NumberedFinding[];
  /** The thing whose spacing the ladders show. */
  objectId: string | null;
  layers: ReadonlySet<Layer>;
  playhead: Playhead;
  chosenFinding: string | null;
  onChooseFinding: (findingId: string) => void;
  /** The finding whose mend is drawn. */
  mend: string | null;
  className?: string;
  /** Stands on the surround: progress, what to know of this picture. */
  children?: ReactNode;
}

const NO_ROOM = { top: 0, right: 0, bottom: 0, left: 0 };
/** Keeps the ladder's rail clear of the picture where the surround has room for it. */
const LADDER_ROOM = { top: 6, right: 6, bottom: 36, left: 6 };
const NOTHING = { objects: [] as DrawnObject[], neighbours: () => [] as number[] };

function drawn(reading: Reading) {
  const objects = reading.objects.map((object) => ({
    id: object.id,
    drawings: drawingsOf(object, reading.source),
    flights: object.flights,
  }));
  const exposure = reading.source.exposure.toSorted((a, b) => a - b);
  const neighbours = (frame: number) => {
    const current = exposure.findLastIndex((start) => start <= frame);
    return current === -1 ? [] : [exposure[current - 1], exposure[current + 1]].filter((one) => one !== undefined);
  };
  return { objects, neighbours };
}

/** The picture on its grey surround, with the layers over it in picture px. */
export function PictureStage(props: PictureStageProps) {
  const { takeId, firstFrame, picture, reading, layers, playhead, className, children } = props;
  const ref = useRef<HTMLDivElement>(null);
  const room = useSize(ref);
  const narrow = useMediaQuery('(max-width: 47.99rem)');
  const control = useView(picture, room, narrow ? NO_ROOM : LADDER_ROOM);
  const { view } = control;
  const hand = useHand(ref, control);
  const { objects, neighbours } = useMemo(() => (reading ? drawn(reading) : NOTHING), [reading]);
  const seen: Box = useMemo(
    () => ({ left: view.x, top: view.y, width: room.width / view.scale, height: room.height / view.scale }),
    [view, room],
  );
  const thing = (frame: number) => {
    const drawing = objects.map((object) => drawingOn(object.drawings, frame)).find((one) => one !== undefined);
    return drawing && reading ? toPicture(drawing, cameraAt(reading.camera, frame)) : undefined;
  };
  const zoom = (factor: number) => {
    const at = thing(playhead.frame());
    control.zoom(factor, at && { x: (at.x - view.x) * view.scale, y: (at.y - view.y) * view.scale });
  };
  useFollowThing(control, room, playhead, thing);
  useKeys('Picture', [
    { key: '+', says: 'Closer', run: () => zoom(1.5) },
    { key: '-', says: 'Further away', run: () => zoom(1 / 1.5), shown: '−' },
    { key: '0', says: 'The whole picture', run: control.fit },
  ]);
  return (
    <div
      ref={ref}
      {...hand}
      data-testid="stage"
      style={{ '--aspect': picture.width / picture.height } as CSSProperties}
      className={`relative overflow-hidden bg-surround ${control.fitted ? 'touch-pan-y' : 'cursor-grab touch-none active:cursor-grabbing'} ${className ?? ''}`}
    >
      {room.width > 0 && (
        <>
          <FramePicture
            takeId={takeId}
            firstFrame={firstFrame}
            width={picture.width}
            height={picture.height}
            view={view}
            playhead={playhead}
            under={layers.has('under') ? neighbours : NOTHING.neighbours}
          />
          <Overlay {...props} objects={objects} view={view} seen={seen} room={room} beside={!narrow} />
        </>
      )}
      <ZoomControls control={control} onZoom={zoom} />
      {children}
    </div>
  );
}
