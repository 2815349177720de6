import type { Take } from '../../../shared/api/takes.ts';
import { TimeAgo } from '../../components/TimeAgo.tsx';

const DID: Record<NonNullable<Take['decision']>['state'], string> = {
  'another-pass': 'asked for another pass',
  cleared: 'cleared this take',
  waived: 'waived what is off',
};

/** Who decided on a take, what, when, and the remark. */
export function DecisionWords({ decision }: { decision: NonNullable<Take['decision']> }) {
  return (
    <p className="px-1 text-sm">
      <b className="font-semibold">{decision.by.name}</b> {DID[decision.state]}{' '}
      <span className="text-graphite">
        · <TimeAgo at={decision.decidedAt} />
      </span>
      {decision.remark && <span className="block whitespace-pre-wrap">{decision.remark}</span>}
    </p>
  );
}
