import { z } from 'zod';
import type { Post } from '../../../shared/api/drafts.ts';
import { shotNumberSchema } from '../../../shared/api/names.ts';
import type { ShotWithTakes } from '../../../shared/api/shots.ts';
import type { Hold } from '../../../shared/reading/document.ts';
import { FRAME_RATES, parseFrameRate } from '../../lib/frameRates.ts';

/** The choice of a rate that is not on the list. */
export const OTHER_RATE = 'other';
/** The choice to have the hold found from the drawings. */
export const FIND_HOLD = 'find';

/** What the form holds: texts as they are written. */
export interface PostValues {
  shotNumber: string;
  shotTitle: string;
  /** `24/1`, or `other`. */
  rate: string;
  otherRate: string;
  hold: string;
  firstFrame: string;
  changed: string;
  intended: string;
}

/** The form before anything is written. */
export const EMPTY_POST: PostValues = {
  shotNumber: '',
  shotTitle: '',
  rate: '24/1',
  otherRate: '',
  hold: FIND_HOLD,
  firstFrame: '',
  changed: '',
  intended: '',
};

/** A frame rate as the form holds it. */
export const rateValue = ({ num, den }: { num: number; den: number }) => `${num}/${den}`;

const HOLDS: Record<string, Hold | null> = { [FIND_HOLD]: null, '1': 1, '2': 2, '3': 3, mixed: 'mixed' };

/** The shot a number belongs to, however its letters are written. */
export function shotOf(shots: readonly ShotWithTakes[], number: string): ShotWithTakes | undefined {
  const wanted = number.trim().toLowerCase();
  return wanted ? shots.find((shot) => shot.number.toLowerCase() === wanted) : undefined;
}

/** The rate that is chosen or written; null while it is none. */
export function rateOf(values: Pick<PostValues, 'rate' | 'otherRate'>) {
  return parseFrameRate(values.rate === OTHER_RATE ? values.otherRate : values.rate);
}

/** The form's own check, a sentence for each field. The server checks the same again. */
export function postFormSchema(shots: readonly ShotWithTakes[]) {
  return z
    .object({
      shotNumber: z
        .string()
        .trim()
        .min(1, 'Which shot is it? Write its number, such as 020-0140.')
        .pipe(shotNumberSchema),
      shotTitle: z.string().max(120, 'A title holds 120 characters.'),
      rate: z.string(),
      otherRate: z.string(),
      hold: z.string(),
      firstFrame: z.string().regex(/^\s*-?\d{1,7}\s*$/, 'The first frame is a whole number, such as 1 or 1001.'),
      changed: z.string().max(2000, 'Up to 2,000 characters fit here.'),
      intended: z.string().max(2000, 'Up to 2,000 characters fit here.'),
    })
    .superRefine((values, context) => {
      if (!shotOf(shots, values.shotNumber) && values.shotTitle.trim() === '') {
        context.addIssue({ code: 'custom', path: ['shotTitle'], message: 'This shot is new. Give it a title.' });
      }
      if (!rateOf(values)) {
        context.addIssue({
          code: 'custom',
          path: [values.rate === OTHER_RATE ? 'otherRate' : 'rate'],
          message: 'Write frames a second between 1 and 240: 12, 12.5 or 24000/1001.',
        });
      }
    });
}

/** What goes to the server. */
export function postOf(values: PostValues, shots: readonly ShotWithTakes[]): Post {
  const shot = shotOf(shots, values.shotNumber);
  return {
    shotNumber: shot?.number ?? values.shotNumber.trim(),
    shotTitle: shot ? undefined : values.shotTitle.trim(),
    fps: rateOf(values) ?? { num: FRAME_RATES[0]!.num, den: FRAME_RATES[0]!.den },
    hold: HOLDS[values.hold] ?? null,
    firstFrame: Number(values.firstFrame),
    changed: values.changed.trim(),
    intended: values.intended.trim(),
  };
}
