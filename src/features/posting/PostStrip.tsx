import { useIsMutating, useQuery } from '@tanstack/react-query';
import { useCallback, useEffect, useRef, useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router';
import type { Draft } from '../../../shared/api/drafts.ts';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { ApiProblem } from '../../lib/ApiProblem.ts';
import { draftOptions } from '../../lib/queries/draft.ts';
import { sheetOptions } from '../../lib/queries/shots.ts';
import { paths } from '../../lib/paths.ts';
import { keepValues } from './keptValues.ts';
import { PostForm } from './PostForm.tsx';
import { StripSide } from './StripSide.tsx';
import { draftChanges, usePost } from './usePost.ts';
import { type Upload, useUpload } from './useUpload.ts';

/** Posting a strip: the pictures on the left, what they cannot say on the right. The address keeps the draft. */
export function PostStrip({ slug }: { slug: string }) {
  const navigate = useNavigate();
  const [search, setSearch] = useSearchParams();
  const asked = search.get('draft');
  const { data: sheet } = useQuery(sheetOptions(slug));
  const reading = useQuery({ ...draftOptions(asked ?? ''), enabled: asked !== null });
  // Frames may not be sent to a post that takes none: they start a new one.
  const gone = reading.error instanceof ApiProblem && GONE.has(reading.error.code) ? reading.error.detail : null;
  const draftId = gone === null ? asked : null;
  const draft = gone === null ? reading.data : undefined;
  const post = usePost(slug, draftId);
  const underWay = useRef(false);

  const sending = useUpload(
    slug,
    draftId,
    useCallback(
      (id: string) =>
        setSearch(
          (have) => {
            have.set('draft', id);
            return have;
          },
          { replace: true },
        ),
      [setSearch],
    ),
  );
  const [wrongCut, setWrongCut] = useState(false);
  const changing = useIsMutating({ mutationKey: draftChanges(draftId) }) > 0;
  const uploading = sending.upload.status === 'sending';
  useWarningBeforeLeaving(uploading);

  return (
    <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-4 lg:grid-cols-[minmax(0,1fr)_24rem]">
      {gone !== null && <ErrorNote className="lg:col-span-2">{gone} Frames you choose here start a new one.</ErrorNote>}
      <StripSide draft={draft} sending={sending} onWrongCut={setWrongCut} />
      <PostForm
        slug={slug}
        shots={sheet?.shots ?? []}
        draft={draft}
        shotNumber={search.get('shot')}
        notYet={notYet(sending.upload, draft, changing, wrongCut)}
        // Once posted, the button holds still until the page of the take is there.
        posting={post.isPending || post.isSuccess}
        problem={post.error}
        onPost={(body) => {
          // A second click may come before the button knows that the first is on its way.
          if (underWay.current) return;
          underWay.current = true;
          post.mutate(body, {
            onSuccess: (take) => {
              keepValues(slug, null);
              void navigate(paths.take(slug, take.shotNumber, take.number), { replace: true });
            },
            onError: () => {
              underWay.current = false;
            },
          });
        }}
      />
    </div>
  );
}

/** The address may be an old one: the post was posted, thrown away, or is someone else's. */
const GONE = new Set<ApiProblem['code']>(['draft_closed', 'not_found', 'not_allowed']);

/** Why the strip cannot be posted yet, as a sentence; null when it can. */
function notYet(upload: Upload, draft: Draft | undefined, changing: boolean, wrongCut: boolean): string | null {
  if (upload.status === 'sending') return 'The frames are still on their way.';
  if (upload.status === 'failed') return 'Some frames have not arrived. Send the rest or leave them out.';
  if (!draft || draft.pictures.length === 0) return 'Choose the frames first.';
  if (wrongCut) return 'The strip cannot be cut as it is written.';
  if (changing) return 'The strip is being put in order.';
  return draft.ready ? null : 'The strip is not ready yet.';
}

function useWarningBeforeLeaving(active: boolean) {
  useEffect(() => {
    if (!active) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [active]);
}
