import { acrossUneven } from './acrossUneven.ts';
import { apexOffCentre } from './apexOffCentre.ts';
import { bounceGains } from './bounceGains.ts';
import { gravityChanges } from './gravityChanges.ts';
import { gravityOffScale } from './gravityOffScale.ts';
import { hang } from './hang.ts';
import { heldFrame } from './heldFrame.ts';
import { pop } from './pop.ts';
import type { FindingRule } from './rule.ts';
import { spacingOffPath } from './spacingOffPath.ts';
import { tooStraight } from './tooStraight.ts';

/** Every kind of finding the engine knows, in the order in which they are told. */
export const FINDING_RULES: readonly FindingRule[] = [
  apexOffCentre,
  tooStraight,
  hang,
  acrossUneven,
  spacingOffPath,
  gravityChanges,
  gravityOffScale,
  pop,
  heldFrame,
  bounceGains,
];
