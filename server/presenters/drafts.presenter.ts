import type { Draft as WireDraft, RefusedFile } from '../../shared/api/drafts.ts';
import type { Draft } from '../entities/Draft.ts';
import type { DraftPicture } from '../entities/DraftPicture.ts';

/** A draft with what was worked out about it. */
export interface DraftParts {
  draft: Draft;
  pictures: { picture: DraftPicture; number: number | null }[];
  firstFrame: number | null;
  missingFrames: number[];
  refused: RefusedFile[];
  warnings: string[];
  ready: boolean;
}

/** A draft as its owner sees it; file names of ours stay here. */
export function presentDraft({ draft, pictures, ...rest }: DraftParts): WireDraft {
  return {
    id: draft.id,
    pictures: pictures.map(({ picture, number }) => ({
      name: picture.name,
      width: picture.width,
      height: picture.height,
      number,
    })),
    grid: draft.grid,
    ...rest,
  };
}
