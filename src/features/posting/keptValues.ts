import { EMPTY_POST, type PostValues } from './postValues.ts';

const keyOf = (slug: string) => `spandrel.post.${slug}`;

/** What was written in the form before the page was reloaded or left, in this tab only. */
export function keptValues(slug: string): PostValues {
  try {
    const kept: unknown = JSON.parse(sessionStorage.getItem(keyOf(slug)) ?? '{}');
    return { ...EMPTY_POST, ...(kept as Partial<PostValues>) };
  } catch {
    return EMPTY_POST;
  }
}

/** Keeps what is written until it is posted; null forgets it. */
export function keepValues(slug: string, values: PostValues | null): void {
  try {
    if (values) sessionStorage.setItem(keyOf(slug), JSON.stringify(values));
    else sessionStorage.removeItem(keyOf(slug));
  } catch {
    return;
  }
}
