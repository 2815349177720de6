import { useQuery } from '@tanstack/react-query';
import { useCallback, useEffect } from 'react';
import { useNavigate, useSearchParams } from 'react-router';
import { draftOptions } from '../../lib/queries/draft.ts';
import { sheetOptions } from '../../lib/queries/shots.ts';
import { paths } from '../../lib/paths.ts';
import { keepValues } from './keptValues.ts';
import { PostForm } from './PostForm.tsx';
import { StripSide } from './StripSide.tsx';
import { usePost } from './usePost.ts';
import { useUpload } from './useUpload.ts';

/** Posting a strip: the pictures on the left, what they cannot say on the right. The address keeps the draft. */
export function PostStrip({ slug }: { slug: string }) {
  const navigate = useNavigate();
  const [search, setSearch] = useSearchParams();
  const draftId = search.get('draft');
  const { data: sheet } = useQuery(sheetOptions(slug));
  const { data: draft } = useQuery({ ...draftOptions(draftId ?? ''), enabled: draftId !== null });
  const post = usePost(slug, draftId);

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
  const uploading = sending.upload.status === 'sending';
  useWarningBeforeLeaving(uploading);

  return (
    <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_24rem]">
      <StripSide draft={draft} sending={sending} />
      <PostForm
        slug={slug}
        shots={sheet?.shots ?? []}
        draft={draft}
        shotNumber={search.get('shot')}
        uploading={uploading || sending.upload.status === 'failed'}
        posting={post.isPending}
        problem={post.error}
        onPost={(body) =>
          post.mutate(body, {
            onSuccess: (take) => {
              keepValues(slug, null);
              void navigate(paths.take(slug, take.shotNumber, take.number), { replace: true });
            },
          })
        }
      />
    </div>
  );
}

function useWarningBeforeLeaving(active: boolean) {
  useEffect(() => {
    if (!active) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [active]);
}
