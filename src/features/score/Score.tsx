import {
  type CSSProperties,
  type PointerEvent,
  type ReactNode,
  type RefObject,
  useCallback,
  useEffect,
  useMemo,
  useRef,
} from 'react';
import type { Reading } from '../../../shared/reading/document.ts';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import type { Playhead } from '../../lib/playhead.ts';
import { cameraAt, toPicture } from '../../lib/stage.ts';
import { useMediaQuery } from '../../lib/useMediaQuery.ts';
import { useSize } from '../../lib/useSize.ts';
import { columnMiddle, frameAt, layColumns, MIN_COLUMN, scrollToSee, THUMB_COLUMN } from './columns.ts';
import { FindingsLane } from './FindingsLane.tsx';
import { HangingCard } from './HangingCard.tsx';
import { LitColumn } from './LitColumn.tsx';
import { NotesLane, type Pin } from './NotesLane.tsx';
import { SpacingLane } from './SpacingLane.tsx';
import { spacingOf } from './spacing.ts';
import { StripLane } from './StripLane.tsx';
import { useVisibleFrames } from './useVisibleFrames.ts';

export interface ScoreProps {
  takeId: string;
  firstFrame: number;
  frames: number;
  missing: readonly number[];
  playhead: Playhead;
  picture: { width: number; height: number };
  /** With its points on the stage. Null while there is none: the strip and the notes are shown alone. */
  reading: Reading | null;
  /** The thing whose spacing the lanes show. */
  objectId: string | null;
  findings: readonly NumberedFinding[];
  chosenFinding: string | null;
  onChooseFinding: (findingId: string) => void;
  none: string;
  pins: readonly Pin[];
  openPin: string | null;
  onOpenPin: (key: string) => void;
  /** What hangs below from a frame: the open thread, or the note being written. */
  hanging: { frame: number; content: ReactNode } | null;
}

const ACROSS = 54;
const UP = 86;
const STILL = { moved: false, offsets: [] };
const NOTHING = { exposure: [], frames: 0 };

/** The score: the lanes under the picture, one column a frame, on one axis. */
export function Score(props: ScoreProps) {
  const { takeId, firstFrame, frames, playhead, reading, objectId, findings, hanging } = props;
  const scroller = useRef<HTMLElement>(null);
  const narrow = useMediaQuery('(max-width: 47.99rem)');
  const names = narrow ? 76 : 116;
  const seen = Math.max(0, useSize(scroller).width - names);
  const columns = useMemo(() => layColumns(frames, seen, narrow ? THUMB_COLUMN : MIN_COLUMN), [frames, seen, narrow]);
  const { scrollLeft, ...range } = useVisibleFrames(scroller, columns, seen);
  useFollow(scroller, playhead, columns, seen);

  const object = reading?.objects.find((one) => one.id === objectId) ?? null;
  const own = useMemo(() => findings.filter((finding) => finding.object === objectId), [findings, objectId]);
  const source = reading?.source ?? NOTHING;
  const across = useMemo(() => (object ? spacingOf(object, source, own, 'across') : []), [object, source, own]);
  const up = useMemo(() => (object ? spacingOf(object, source, own, 'up') : []), [object, source, own]);

  const { width } = props.picture;
  const camera = reading?.camera ?? STILL;
  const thingAt = useCallback(
    (frame: number) => {
      const mark = object?.marks.find((one) => one.frame === frame);
      return mark ? toPicture(mark, cameraAt(camera, frame)).x / width : null;
    },
    [object, width, camera],
  );

  const frameUnder = (event: PointerEvent) => {
    const box = scroller.current!.getBoundingClientRect();
    const x = event.clientX - box.left + scroller.current!.scrollLeft - names;
    return event.clientX - box.left < names || x > columns.total ? null : frameAt(columns, x);
  };
  const choose = (event: PointerEvent) => {
    if ((event.target as Element).closest('button')) return;
    const frame = frameUnder(event);
    if (frame !== null) playhead.choose(frame);
  };
  const shared = { columns, range, firstFrame };
  return (
    <div style={{ '--names': `${names}px` } as CSSProperties}>
      <section
        ref={scroller}
        aria-label="Score"
        data-testid="score"
        className="relative overflow-x-auto overflow-y-hidden overscroll-x-contain rounded-b-card border border-t-0 border-rule bg-sheet max-md:rounded-none max-md:border-x-0"
        onPointerMove={(event) => {
          if (event.pointerType !== 'mouse') return;
          if (event.buttons === 1) choose(event);
          else playhead.point(frameUnder(event));
        }}
        onPointerLeave={() => playhead.point(null)}
        onPointerDown={(event) => event.pointerType === 'mouse' && event.button === 0 && choose(event)}
        onPointerUp={(event) => event.pointerType !== 'mouse' && choose(event)}
      >
        <div className="relative" style={{ width: names + columns.total }}>
          <LitColumn columns={columns} playhead={playhead} />
          <StripLane
            {...shared}
            takeId={takeId}
            playhead={playhead}
            missing={props.missing}
            aspect={props.picture.width / props.picture.height}
            thingAt={thingAt}
          />
          {reading && (
            <>
              <SpacingLane {...shared} name="Across" spacing={across} height={ACROSS} playhead={playhead} />
              <SpacingLane {...shared} name="Up and down" spacing={up} height={UP} playhead={playhead} />
              <FindingsLane
                {...shared}
                findings={findings}
                chosen={props.chosenFinding}
                onChoose={props.onChooseFinding}
                none={props.none}
              />
            </>
          )}
          <NotesLane {...shared} pins={props.pins} open={props.openPin} onOpen={props.onOpenPin} />
        </div>
      </section>
      {hanging && (
        <HangingCard pinX={names + columnMiddle(columns, hanging.frame) - scrollLeft} least={names} whole={narrow}>
          {hanging.content}
        </HangingCard>
      )}
    </div>
  );
}

/** Keeps the chosen frame in view. */
function useFollow(
  scroller: RefObject<HTMLElement | null>,
  playhead: Playhead,
  columns: ReturnType<typeof layColumns>,
  seen: number,
) {
  useEffect(() => {
    const see = () => {
      const element = scroller.current;
      if (!element || seen <= 0) return;
      const to = scrollToSee(columns, playhead.frame(), element.scrollLeft, seen);
      if (to !== null) element.scrollTo({ left: to });
    };
    see();
    // Not through React: a step would draw all lanes again only to scroll them.
    return playhead.subscribe(see);
  }, [scroller, playhead, columns, seen]);
}
