import { PlainPage } from './PlainPage.tsx';

/** Shown to someone who is signed in and belongs to no production yet. */
export function NoProduction() {
  return (
    <PlainPage title="No production yet">
      You are signed in, but nobody has added you to a production. Ask its owner to add you by the address you sign in
      with; then load this page again.
    </PlainPage>
  );
}
