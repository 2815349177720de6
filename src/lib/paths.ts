/** Every address of the client, written once. */
export const paths = {
  signIn: (next?: string) => (next && next !== '/' ? `/sign-in?next=${encodeURIComponent(next)}` : '/sign-in'),
  feed: (slug: string) => `/p/${slug}`,
  sheet: (slug: string) => `/p/${slug}/shots`,
  people: (slug: string) => `/p/${slug}/people`,
  post: (slug: string, shotNumber?: string) =>
    `/p/${slug}/post${shotNumber ? `?shot=${encodeURIComponent(shotNumber)}` : ''}`,
  /** The frame in the address is the production's own number, such as 1011. */
  take: (slug: string, shotNumber: string, takeNumber: number, shownFrame?: number) =>
    `/p/${slug}/shots/${encodeURIComponent(shotNumber)}/takes/${takeNumber}${shownFrame === undefined ? '' : `?frame=${shownFrame}`}`,
};
