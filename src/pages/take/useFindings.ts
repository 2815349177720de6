import { useMemo, useState } from 'react';
import type { Reading } from '../../../shared/reading/document.ts';
import { type NumberedFinding, numberedFindings } from '../../lib/numberedFindings.ts';
import type { Playhead } from '../../lib/playhead.ts';

/** The frame that shows a finding best: where its mend is longest, else where it begins. */
export function tellingFrame(finding: Pick<NumberedFinding, 'mend' | 'fromFrame'>): number {
  const longest = finding.mend.toSorted((a, b) => Math.hypot(b.dx, b.dy) - Math.hypot(a.dx, a.dy))[0];
  return longest?.frame ?? finding.fromFrame;
}

const NONE: NumberedFinding[] = [];

/** The findings of a reading, the chosen one, and the one whose mend is shown. `onShown`: a mend is to be seen now. */
export function useFindings(reading: Reading | null, playhead: Playhead, onShown: () => void) {
  const findings = useMemo(() => (reading ? numberedFindings(reading) : NONE), [reading]);
  const [chosen, setChosen] = useState<string | null>(null);
  const [mend, setMend] = useState<string | null>(null);
  const go = (finding: NumberedFinding) => {
    setChosen(finding.id);
    const frame = playhead.frame();
    if (frame < finding.fromFrame || frame > finding.toFrame) playhead.choose(tellingFrame(finding));
  };
  return {
    findings,
    chosen,
    mend,
    choose: (id: string) => {
      const finding = findings.find((one) => one.id === id);
      if (chosen === id) setChosen(null);
      else if (finding) {
        go(finding);
        onShown();
      }
    },
    step: (by: 1 | -1) => {
      const at = findings.findIndex((one) => one.id === chosen);
      const next = at === -1 ? (by === 1 ? findings[0] : findings.at(-1)) : findings[at + by];
      if (!next) return;
      setChosen(next.id);
      playhead.choose(tellingFrame(next));
    },
    showMend: (id: string | null) => {
      setMend(id);
      const finding = findings.find((one) => one.id === id);
      if (!finding) return;
      onShown();
      setChosen(finding.id);
      if (!finding.mend.some((one) => one.frame === playhead.frame())) playhead.choose(tellingFrame(finding));
    },
  };
}
