import { z } from 'zod';

/**
 * One row of the tolerance table: below `from` there is nothing to say, then a finding is minor, from `visible` on it is
 * visible, from `strong` on strong. All three are in the unit of the measure (a share, an exponent, a count).
 */
const bandSchema = z
  .object({ from: z.number().positive(), visible: z.number().positive(), strong: z.number().positive() })
  .refine((band) => band.from <= band.visible && band.visible <= band.strong, {
    message: 'A band grows: from, then visible, then strong.',
  });
export type Band = z.infer<typeof bandSchema>;

/**
 * The production's tolerances. The defaults are our own bands on published perception thresholds, not published limits.
 * - `apexTime`: distance of the apex time between level heights from 0.5
 * - `exponent`: distance of the exponent p from 2 (`too-straight`, `hang`)
 * - `acrossDrift`: change of across speed over the flight, share of its mean
 * - `acrossSpread`: spread of the across steps, share of their mean
 * - `pathSteps`: spread of steps along the path against those of the fall
 * - `gravity`: relative difference of gravity (between flights, or against the scale)
 * - `pop`: distance off the arc as a share of the local step
 * - `repeats`: drawings repeated off the pattern
 * - `bounceGain`: height ratio over the bounce before
 */
export const tolerancesSchema = z.object({
  apexTime: bandSchema,
  exponent: bandSchema,
  acrossDrift: bandSchema,
  acrossSpread: bandSchema,
  pathSteps: bandSchema,
  gravity: bandSchema,
  pop: bandSchema,
  repeats: bandSchema,
  bounceGain: bandSchema,
});
export type Tolerances = z.infer<typeof tolerancesSchema>;

export const DEFAULT_TOLERANCES: Tolerances = {
  apexTime: { from: 0.025, visible: 0.045, strong: 0.08 },
  exponent: { from: 0.15, visible: 0.3, strong: 0.6 },
  acrossDrift: { from: 0.1, visible: 0.2, strong: 0.35 },
  acrossSpread: { from: 0.06, visible: 0.12, strong: 0.17 },
  pathSteps: { from: 0.08, visible: 0.15, strong: 0.25 },
  gravity: { from: 0.15, visible: 0.25, strong: 0.4 },
  pop: { from: 0.08, visible: 0.15, strong: 0.3 },
  repeats: { from: 1, visible: 1, strong: 2 },
  bounceGain: { from: 1.03, visible: 1.1, strong: 1.25 },
};
