import type { Finding, ReadObject } from '../reading/document.ts';
import type { Draft } from './findings/rule.ts';
import { FINDING_RULES } from './findings/table.ts';
import { isPinned } from './hand.ts';
import { chartOf, mendOf } from './mend.ts';
import type { TrackView } from './view.ts';
import { frameOf, framesOf } from './view.ts';

/** The findings of a track, in the order of the table, with their mends and timing charts. */
export function findingsOf(view: TrackView): Finding[] {
  return standing(FINDING_RULES.flatMap((rule) => rule.find(view)).filter((draft) => draft.flight.judged)).map(
    (draft) => {
      const { from, to } = placeOf(view, draft);
      return {
        id: `${draft.flight.id}-${draft.kind}-${from}`,
        kind: draft.kind,
        object: view.id,
        flight: draft.flight.id,
        fromFrame: from,
        toFrame: to,
        severity: draft.severity,
        title: draft.title,
        detail: draft.detail,
        mend: mendOf(view, draft),
        chart: draft.move ? [] : chartOf(view, draft.flight),
      };
    },
  );
}

/**
 * First and last frame of a finding. What lies on one drawing stays there, also just beyond a landing; what lies on a stretch is
 * kept within its flight, so that it never ends before it begins.
 */
function placeOf(view: TrackView, draft: Draft): { from: number; to: number } {
  if (draft.from === draft.to) {
    const frame = Math.round(frameOf(view, draft.from));
    return { from: frame, to: frame };
  }
  const whole = framesOf(view, draft.flight);
  const within = (frame: number) => Math.min(whole.to, Math.max(whole.from, frame));
  const from = within(Math.floor(frameOf(view, draft.from)));
  return { from, to: Math.max(from, within(Math.ceil(frameOf(view, draft.to)))) };
}

/**
 * Two findings on one flight only where each stands alone: the account fits them together, so a second one is what would remain
 * once the first is mended; a slight one beside another is left unsaid. The second's sentence says so.
 */
function standing(drafts: readonly Draft[]): Draft[] {
  const out: Draft[] = [];
  for (const draft of drafts) {
    const first = out.find((one) => one.flight === draft.flight && one.kind !== draft.kind);
    if (first && draft.severity === 'minor') continue;
    out.push(
      first ? { ...draft, detail: `Even with that put right (${first.title.toLowerCase()}): ${draft.detail}` } : draft,
    );
  }
  return out;
}

/** Where two spans meet: bounces, take-offs, landings, edges. A thing that is let go touches nothing, so that is no contact. */
export function contactsOf(view: TrackView, centre: { x: number; y: number }): ReadObject['contacts'] {
  const { path, knots } = view.account.fit;
  const out: ReadObject['contacts'] = [];
  for (let k = 1; k < path.spans.length; k += 1) {
    const released = path.spans[k - 1]!.kind === 'rest' && path.spans[k]!.tangent;
    if (released) continue;
    out.push({
      frame: frameOf(view, knots.t[k]!),
      x: knots.x[k]! + centre.x,
      y: knots.y[k]! + centre.y,
      origin: isPinned(view.field.hand, knots.t[k]!) ? 'hand' : 'read',
    });
  }
  return out;
}
