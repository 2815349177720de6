import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useMemo, useRef, useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router';
import type { ShotWithTakes } from '../../../shared/api/shots.ts';
import { type Take, takeContracts } from '../../../shared/api/takes.ts';
import { can } from '../../../shared/policy/can.ts';
import { Button } from '../../components/Button.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { PegBar } from '../../features/layers/PegBar.tsx';
import { PictureStage } from '../../features/layers/PictureStage.tsx';
import { FrameNumber, PlayControl } from '../../features/playhead/PlayControl.tsx';
import { outcomeOf } from '../../features/reading/OutcomeCard.tsx';
import { TakeMenu } from '../../features/review/TakeMenu.tsx';
import { Score } from '../../features/score/Score.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { call } from '../../lib/call.ts';
import { useKeys } from '../../lib/keys.ts';
import { paths } from '../../lib/paths.ts';
import { createPlayhead } from '../../lib/playhead.ts';
import { applyTake, readingOptions } from '../../lib/queries/take.ts';
import { useActor } from '../../lib/queries/useActor.ts';
import { stagedReading } from '../../lib/stage.ts';
import { useMediaQuery } from '../../lib/useMediaQuery.ts';
import { HangingNotes } from './HangingNotes.tsx';
import { DESK, GRID, STAGE } from './layout.ts';
import { ObjectSwitch } from './ObjectSwitch.tsx';
import { TakeActions, ThumbBar } from './TakeActions.tsx';
import { TakeHead } from './TakeHead.tsx';
import { TakeMargin } from './TakeMargin.tsx';
import { useFindings } from './useFindings.ts';
import { frameOfAddress, useTakeAddress } from './useTakeAddress.ts';
import { useThreads } from './useThreads.ts';

interface TakeDeskProps {
  slug: string;
  take: Take;
  /** The take's shot with its other takes; null while it is on its way. */
  shot: ShotWithTakes | null;
}

/** The take page once its take is there. */
export function TakeDesk({ slug, take, shot }: TakeDeskProps) {
  const actor = useActor(slug);
  const client = useQueryClient();
  const navigate = useNavigate();
  const { firstFrame } = take;
  const [search] = useSearchParams();
  const asked = frameOfAddress(search, firstFrame);
  const [playhead] = useState(() => createPlayhead(take.frames, asked ?? 1));
  const { layers, onSwitch } = useTakeAddress(playhead, firstFrame);
  const readingQuery = useQuery({ ...readingOptions(take.id), enabled: take.reading.status === 'read' });
  const reading = (take.reading.status === 'read' && readingQuery.data) || null;
  const staged = useMemo(() => reading && stagedReading(reading), [reading]);
  const desk = useRef<HTMLDivElement>(null);
  // Where the margin lies below the picture, what it points at would be out of sight.
  const showPicture = () => {
    const top = desk.current?.getBoundingClientRect().top ?? 0;
    if (top < 0) desk.current?.scrollIntoView({ behavior: 'smooth', block: 'start' });
  };
  const findings = useFindings(reading, playhead, showPicture);
  const talk = useThreads(take, actor.person, playhead, asked !== null);
  const readAgain = useMutation({
    mutationFn: () => call(takeContracts.readAgain, { params: { takeId: take.id } }),
    onSuccess: (answer) => applyTake(client, slug, answer),
  });

  const objectIds = useMemo(
    () => (reading ? reading.objects.filter((object) => object.marks.length > 1).map((object) => object.id) : []),
    [reading],
  );
  const [ownObject, setOwnObject] = useState<string | null>(null);
  const objectId =
    [ownObject, findings.findings[0]?.object ?? null].find((id) => id !== null && objectIds.includes(id)) ??
    objectIds[0] ??
    null;
  const picture = useMemo(() => ({ width: take.width, height: take.height }), [take.width, take.height]);
  const narrow = useMediaQuery('(max-width: 47.99rem)');
  const mayWrite = can(actor, 'note:write');
  const startNote = () => mayWrite && talk.startNote(playhead.frame());

  useKeys('Notes and findings', [
    { key: 'n', says: 'Write a note on the chosen frame', shown: 'N', run: startNote },
    { key: 'ArrowUp', says: 'Finding before', shown: '↑', shift: false, run: () => findings.step(-1) },
    { key: 'ArrowDown', says: 'Next finding', shown: '↓', shift: false, run: () => findings.step(1) },
    { key: 'ArrowUp', says: 'Note before', shown: 'Shift ↑', shift: true, run: () => talk.step(-1) },
    { key: 'ArrowDown', says: 'Next note', shown: 'Shift ↓', shift: true, run: () => talk.step(1) },
  ]);

  const latest = Math.max(take.number, ...(shot?.takes.map((one) => one.number) ?? []));
  const newest = take.number === latest;
  return (
    <div className={DESK}>
      <TakeHead
        slug={slug}
        take={take}
        title={shot?.title ?? null}
        latest={latest}
        narrow={narrow}
        menu={
          <TakeMenu
            slug={slug}
            take={take}
            actor={actor}
            newest={newest}
            onReadAgain={() => readAgain.mutate()}
            onMoved={(moved) => void navigate(paths.take(slug, moved.shotNumber, moved.number), { replace: true })}
          />
        }
      >
        {!narrow && <TakeActions slug={slug} take={take} actor={actor} newest={newest} onWrite={startNote} />}
      </TakeHead>
      {readAgain.error && <ErrorNote className="mb-3">{sentenceOf(readAgain.error)}</ErrorNote>}
      <div className={GRID}>
        <TakeMargin
          slug={slug}
          take={take}
          shot={shot}
          actor={actor}
          reading={reading}
          error={readingQuery.error}
          onRetry={() => void readingQuery.refetch()}
          findings={findings}
        />
        <div ref={desk} className="order-1 min-w-0 lg:order-2">
          <div className="overflow-hidden rounded-t-card border border-rule bg-sheet max-md:rounded-none max-md:border-x-0">
            <PegBar layers={layers} onSwitch={onSwitch} hasReading={reading !== null}>
              <ObjectSwitch ids={objectIds} chosen={objectId} onChoose={setOwnObject} />
              <PlayControl takeId={take.id} fps={take.fps} playhead={playhead} />
              <FrameNumber playhead={playhead} firstFrame={firstFrame} />
            </PegBar>
            <PictureStage
              className={STAGE}
              takeId={take.id}
              firstFrame={firstFrame}
              picture={picture}
              reading={staged}
              findings={findings.findings}
              objectId={objectId}
              layers={layers}
              playhead={playhead}
              chosenFinding={findings.chosen}
              onChooseFinding={findings.choose}
              mend={findings.mend}
            />
          </div>
          <Score
            takeId={take.id}
            firstFrame={firstFrame}
            frames={take.frames}
            picture={picture}
            missing={take.missingFrames}
            playhead={playhead}
            reading={staged}
            objectId={objectId}
            findings={findings.findings}
            chosenFinding={findings.chosen}
            onChooseFinding={findings.choose}
            none={reading && outcomeOf(reading) === 'read' ? 'Nothing is off' : 'Nothing was judged'}
            pins={talk.pins}
            openPin={talk.openPin}
            onOpenPin={talk.togglePin}
            hanging={
              talk.hanging && {
                frame: talk.hanging.kind === 'thread' ? talk.hanging.thread.frame : talk.hanging.frame,
                content: (
                  <HangingNotes
                    slug={slug}
                    take={take}
                    me={actor.person}
                    mayWrite={mayWrite}
                    playhead={playhead}
                    hanging={talk.hanging}
                    talk={talk}
                  />
                ),
              }
            }
          />
          {talk.query.error && (
            <ErrorNote className="mt-3" action={<Button onClick={() => void talk.query.refetch()}>Try again</Button>}>
              The notes did not arrive. {sentenceOf(talk.query.error)}
            </ErrorNote>
          )}
        </div>
      </div>
      {narrow && !talk.isWriting && (
        <ThumbBar slug={slug} take={take} actor={actor} newest={newest} onWrite={startNote} />
      )}
    </div>
  );
}
