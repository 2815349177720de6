import type { Draft } from '../../../shared/api/drafts.ts';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { ContactSheet } from './ContactSheet.tsx';
import { DropZone } from './DropZone.tsx';
import { GridEditor } from './GridEditor.tsx';
import { ReadsBest } from './ReadsBest.tsx';
import { RefusedFiles } from './RefusedFiles.tsx';
import { UploadProgress } from './UploadProgress.tsx';
import { useLocalPictures } from './useLocalPictures.ts';
import { useCut, useRemovePicture } from './usePost.ts';
import type { useUpload } from './useUpload.ts';

export interface StripSideProps {
  draft: Draft | undefined;
  sending: ReturnType<typeof useUpload>;
  /** Whether the cut that is written cannot be made. */
  onWrongCut: (wrong: boolean) => void;
}

/** The strip itself: where frames are dropped, how many arrived, what was refused, and how they lie. */
export function StripSide({ draft, sending, onWrongCut }: StripSideProps) {
  const { upload, add, cancel, retry } = sending;
  const { addresses, keep } = useLocalPictures();
  const cut = useCut(draft?.id ?? null);
  const remove = useRemovePicture(draft?.id ?? null);
  const pictures = draft?.pictures ?? [];
  const single = pictures.length === 1 && upload.status === 'idle' ? pictures[0] : undefined;
  const names = new Set(pictures.map((picture) => picture.name));
  const refused = [...upload.refused, ...(draft?.refused ?? [])].filter((file) => !names.has(file.name));

  const handleFiles = (files: File[]) => {
    if (files.length === 0) return;
    onWrongCut(false);
    keep(files);
    add(files, pictures.length);
  };

  return (
    <div className="space-y-3">
      <DropZone onFiles={handleFiles} slim={pictures.length > 0 || upload.status !== 'idle'} />
      <UploadProgress upload={upload} onCancel={cancel} onRetry={retry} />
      <RefusedFiles files={refused} />
      {draft && pictures.length > 0 && upload.status === 'idle' && draft.warnings.length > 0 && (
        <ErrorNote>
          {draft.warnings.map((warning) => (
            <p key={warning}>{warning}</p>
          ))}
        </ErrorNote>
      )}
      {single && draft ? (
        <GridEditor
          key={single.name}
          picture={single}
          address={addresses.get(single.name)}
          grid={draft.grid}
          onGrid={(grid) => cut.mutate(grid)}
          onWrong={onWrongCut}
          onRemove={(name) => {
            onWrongCut(false);
            remove.mutate(name);
          }}
          problem={cut.isError ? sentenceOf(cut.error) : null}
        />
      ) : (
        pictures.length > 0 && (
          <ContactSheet
            pictures={pictures}
            addresses={addresses}
            missing={draft?.missingFrames ?? []}
            onRemove={(name) => remove.mutate(name)}
          />
        )
      )}
      {pictures.length === 0 && upload.status === 'idle' && <ReadsBest />}
      {remove.isError && <ErrorNote>{sentenceOf(remove.error)}</ErrorNote>}
    </div>
  );
}
