/** The page's own margins; a phone gives the picture its whole width. */
export const DESK = 'mx-auto max-w-[96rem] pt-3 pb-8 max-md:pb-24 md:px-4 lg:px-7';

/** The reading in the left margin, picture and score in the middle; on narrow screens the picture comes first. */
export const GRID =
  'flex flex-col gap-4 lg:grid lg:items-start lg:gap-4 lg:grid-cols-[17.5rem_minmax(0,1fr)] xl:grid-cols-[19.875rem_minmax(0,1fr)]';

/** The picture takes what height is left when the score and the head of a note are on the screen too. */
export const STAGE =
  'max-md:aspect-[var(--aspect,16/9)] max-md:max-h-[58dvh] lg:h-[clamp(14rem,calc(100dvh-34.5rem),64dvh)] md:max-lg:h-[46dvh]';
