import { Button } from '../../components/Button.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { ProgressCount } from '../../components/ProgressCount.tsx';
import type { Upload } from './useUpload.ts';

export interface UploadProgressProps {
  upload: Upload;
  onCancel: () => void;
  onRetry: () => void;
}

/** How many frames arrived, with a way to stop; and what to do when a batch did not arrive. */
export function UploadProgress({ upload, onCancel, onRetry }: UploadProgressProps) {
  if (upload.status === 'idle') return null;
  if (upload.status === 'failed') {
    return (
      <ErrorNote
        action={
          <span className="flex gap-2">
            <Button size="small" kind="quiet" onClick={onCancel}>
              Leave the rest out
            </Button>
            <Button size="small" onClick={onRetry}>
              Send the rest
            </Button>
          </span>
        }
      >
        {upload.sent} of {upload.total} frames arrived. {upload.problem}
      </ErrorNote>
    );
  }
  return (
    <div className="flex items-end gap-4 rounded-card border border-rule bg-sheet px-4 py-3">
      <ProgressCount label="Uploading" done={upload.sent} total={upload.total} unit="frames" className="flex-1" />
      <Button size="small" onClick={onCancel}>
        Cancel
      </Button>
    </div>
  );
}
