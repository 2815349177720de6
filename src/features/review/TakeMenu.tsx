import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Take } from '../../../shared/api/takes.ts';
import { type Actor, can } from '../../../shared/policy/can.ts';
import { buttonClass } from '../../components/Button.tsx';
import { Menu, type MenuItem } from '../../components/Menu.tsx';
import { sheetOptions } from '../../lib/queries/shots.ts';
import { useMediaQuery } from '../../lib/useMediaQuery.ts';
import { DecisionDialog } from './DecisionDialog.tsx';
import { MoveDialog } from './MoveDialog.tsx';
import { useDecide, useMove } from './useReview.ts';

interface TakeMenuProps {
  slug: string;
  take: Take;
  actor: Actor;
  /** Whether the shot has no later take: only that one is decided on. */
  newest: boolean;
  onReadAgain: () => void;
  onMoved: (take: Take) => void;
}

/** What is seldom done to a take: reading it again, moving it to another shot. */
export function TakeMenu({ slug, take, actor, newest, onReadAgain, onMoved }: TakeMenuProps) {
  const [moving, setMoving] = useState(false);
  const [waiving, setWaiving] = useState(false);
  const narrow = useMediaQuery('(max-width: 47.99rem)');
  const decide = useDecide(slug, take.id);
  const move = useMove(slug, take.id);
  const sheet = useQuery({ ...sheetOptions(slug), enabled: moving });
  const underWay = take.reading.status === 'queued' || take.reading.status === 'reading';
  const items: MenuItem[] = [
    ...(narrow && newest && can(actor, 'take:decide', { postedById: take.postedBy.id })
      ? [{ label: 'Waive what is off…', run: () => setWaiving(true) }]
      : []),
    ...(can(actor, 'take:readAgain') && !underWay ? [{ label: 'Read again', run: onReadAgain }] : []),
    ...(can(actor, 'take:move', { postedById: take.postedBy.id })
      ? [{ label: 'Move to another shot…', run: () => setMoving(true) }]
      : []),
  ];
  if (items.length === 0) return null;
  return (
    <>
      <Menu label="More for this take" items={items} align="end" className={buttonClass('plain')}>
        <svg viewBox="0 0 20 20" className="pencil size-4.5" aria-hidden="true">
          <path d="M4 10h.1M10 10h.1M16 10h.1" strokeWidth="3" />
        </svg>
      </Menu>
      <DecisionDialog
        key={`waive-${waiving}`}
        asked={waiving ? 'waived' : null}
        busy={decide.isPending}
        error={decide.error}
        onClose={() => setWaiving(false)}
        onDecide={(state, remark) => decide.mutate({ state, remark }, { onSuccess: () => setWaiving(false) })}
      />
      <MoveDialog
        key={`move-${moving}`}
        open={moving}
        takeNumber={take.number}
        from={take.shotNumber}
        shots={sheet.data?.shots ?? []}
        busy={move.isPending}
        error={move.error}
        onClose={() => {
          setMoving(false);
          move.reset();
        }}
        onMove={(to) =>
          move.mutate(to, {
            onSuccess: (moved) => {
              setMoving(false);
              onMoved(moved);
            },
          })
        }
      />
    </>
  );
}
