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
    <p className="text-sm">
      <b className="font-semibold">{decision.by.name}</b> {DID[decision.state]}{' '}
      <TimeAgo at={decision.decidedAt} className="text-graphite" />
      {decision.remark && <>: {decision.remark}</>}
    </p>
  );
}
