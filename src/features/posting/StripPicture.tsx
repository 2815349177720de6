import clsx from 'clsx';
import type { ReactNode } from 'react';
import type { DraftPicture } from '../../../shared/api/drafts.ts';

/** A long strip is shown at least this high (or wide), px, and scrolls. */
const LEAST = 132;
const LONG = 5;

export interface StripPictureProps {
  picture: DraftPicture;
  address: string | undefined;
  /** What is drawn over it. */
  children: ReactNode;
}

/** The strip picture on its neutral surround; a long one scrolls along its length. */
export function StripPicture({ picture, address, children }: StripPictureProps) {
  const aspect = picture.width / picture.height;
  const long = aspect > LONG || aspect < 1 / LONG;
  return (
    // A region that scrolls has to be reachable by keyboard.
    // oxlint-disable-next-line jsx-a11y/no-noninteractive-tabindex
    <section aria-label="The strip" tabIndex={0} className="max-h-112 overflow-auto rounded-control bg-surround">
      <div
        className={clsx('relative mx-auto', !long && 'max-w-full')}
        style={{
          aspectRatio: aspect,
          ...(aspect > LONG
            ? { height: LEAST, minWidth: '100%' }
            : long
              ? { width: LEAST }
              : { width: `min(100%, ${28 * aspect}rem)` }),
        }}
      >
        {address ? (
          <img src={address} alt={`The strip ${picture.name}`} className="absolute inset-0 size-full" />
        ) : (
          <p className="absolute inset-x-0 bottom-1 text-center text-xs text-pencil-ink">
            The picture itself has arrived. Choose it once more to see it here.
          </p>
        )}
        {children}
      </div>
    </section>
  );
}
