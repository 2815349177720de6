/**
 * Starts a fetch from a loader beside the page's own code, without holding the page back: it shows the shape of what comes.
 * A failure is not lost; the query keeps it and the page's own `useQuery` shows it.
 */
export function warm(...fetches: Promise<unknown>[]): void {
  void Promise.allSettled(fetches);
}
