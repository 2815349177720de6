import type { ShotWithTakes } from '../../../shared/api/shots.ts';
import type { Take } from '../../../shared/api/takes.ts';
import type { Actor } from '../../../shared/policy/can.ts';
import type { Person } from '../../../shared/api/people.ts';
import type { Reading } from '../../../shared/reading/document.ts';
import { Button } from '../../components/Button.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { AnimatorWord } from '../../features/reading/AnimatorWord.tsx';
import { Cautions } from '../../features/reading/Cautions.tsx';
import { FindingsCard } from '../../features/reading/FindingsCard.tsx';
import { FlightList } from '../../features/reading/FlightList.tsx';
import { OutcomeCard, outcomeOf } from '../../features/reading/OutcomeCard.tsx';
import { ReadingUnderWay } from '../../features/reading/ReadingUnderWay.tsx';
import { TakesCard } from '../../features/reading/TakesCard.tsx';
import { DecisionWords } from '../../features/review/DecisionWords.tsx';
import { StampRow } from '../../features/stamps/StampRow.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import type { useFindings } from './useFindings.ts';

interface TakeMarginProps {
  slug: string;
  take: Take;
  shot: ShotWithTakes | null;
  actor: Actor & { person: Person };
  reading: Reading | null;
  /** Why the reading could not be fetched, and how to try again. */
  error: unknown;
  onRetry: () => void;
  findings: ReturnType<typeof useFindings>;
}

/** The left margin: what was written and decided, the reading, what is off, the shot's takes. */
export function TakeMargin({ slug, take, shot, actor, reading, error, onRetry, findings }: TakeMarginProps) {
  const outcome = reading ? outcomeOf(reading) : null;
  const hasFlights = reading?.objects.some((object) => object.flights.length > 0) ?? false;
  return (
    <aside aria-label="Reading" className="order-2 space-y-3 max-lg:px-3.5 lg:order-1">
      <AnimatorWord take={take} />
      <StampRow
        slug={slug}
        takeId={take.id}
        noteId={null}
        board={take.stamps}
        me={actor.person}
        what={`take ${take.number}`}
        className="px-1"
      />
      {take.decision && <DecisionWords decision={take.decision} />}
      {!reading && error == null && <ReadingUnderWay take={take} slug={slug} />}
      {error != null && (
        <ErrorNote
          action={
            <Button size="small" onClick={onRetry}>
              Try again
            </Button>
          }
        >
          {sentenceOf(error)}
        </ErrorNote>
      )}
      {reading && outcome && outcome !== 'read' && <OutcomeCard outcome={outcome} cautions={reading.cautions} />}
      {reading && hasFlights && <FlightList reading={reading} findings={findings.findings} />}
      {reading && (
        <FindingsCard
          findings={findings.findings}
          firstFrame={take.firstFrame}
          chosen={findings.chosen}
          mend={findings.mend}
          onChoose={findings.choose}
          onShowMend={findings.showMend}
        />
      )}
      {reading && outcome === 'read' && <Cautions cautions={reading.cautions} />}
      {shot && <TakesCard slug={slug} takes={shot.takes} currentId={take.id} />}
    </aside>
  );
}
