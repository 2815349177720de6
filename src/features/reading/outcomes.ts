import type { Outcome } from '../../../shared/reading/document.ts';

/** What a reading without a judged flight says, and what to do next. */
export const OUTCOME_SENTENCES: Record<Exclude<Outcome, 'read'>, { title: string; says: string; next: string }> = {
  'no-motion': {
    title: 'Nothing moves in this strip',
    says: 'The frames look alike from first to last, so there is no flight to read.',
    next: 'If something should fly here, post the frames in which it does as the next take.',
  },
  'too-few-marks': {
    title: 'Too few drawings to read',
    says: 'The thing is seen on too few frames. A flight needs at least four drawings in the air.',
    next: 'Post the strip with the frames around the flight, or with the thing in clear view.',
  },
  'not-in-flight': {
    title: 'Nothing flies free here',
    says: 'Something moves, but it rests, rolls or is carried all the way. Its marks and its spacing are shown; nothing is judged.',
    next: 'If it should let go and fly, look at the frame where it leaves the hand.',
  },
  'not-judged': {
    title: 'Measured, not judged',
    says: 'Its marks and its spacing are shown, and nothing is called a fault.',
    next: 'Look at the spacing in the score, and at the path on the picture.',
  },
};
