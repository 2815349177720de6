import { Card } from '../../components/Card.tsx';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import { FindingItem } from './FindingItem.tsx';

interface FindingsCardProps {
  findings: readonly NumberedFinding[];
  firstFrame: number;
  chosen: string | null;
  mend: string | null;
  onChoose: (findingId: string) => void;
  onShowMend: (findingId: string | null) => void;
}

/** What is off, numbered as on the picture. */
export function FindingsCard({ findings, firstFrame, chosen, mend, onChoose, onShowMend }: FindingsCardProps) {
  if (findings.length === 0) return null;
  return (
    <Card className="px-4 py-3" aria-labelledby="findings-heading">
      <h2 id="findings-heading" className="text-md">
        Findings <span className="font-sans text-sm font-normal text-graphite">{findings.length}</span>
      </h2>
      <ol>
        {findings.map((finding) => (
          <FindingItem
            key={finding.id}
            finding={finding}
            firstFrame={firstFrame}
            chosen={chosen === finding.id}
            mendShown={mend === finding.id}
            onChoose={() => onChoose(finding.id)}
            onShowMend={(shown) => onShowMend(shown ? finding.id : null)}
          />
        ))}
      </ol>
    </Card>
  );
}
