import clsx from 'clsx';
import { type DragEvent, useRef, useState } from 'react';
import { Button } from '../../components/Button.tsx';
import { droppedFiles } from './droppedFiles.ts';

export interface DropZoneProps {
  onFiles: (files: File[]) => void;
  /** Something is there already: the zone shrinks to a line. */
  slim: boolean;
}

/** Where frames are dropped or chosen: a numbered set, a folder of it, or one strip picture. */
export function DropZone({ onFiles, slim }: DropZoneProps) {
  const [over, setOver] = useState(false);
  const input = useRef<HTMLInputElement>(null);

  const handleDrop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    void droppedFiles(event.dataTransfer).then(onFiles);
  };

  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={handleDrop}
      className={clsx(
        'rounded-card border-2 border-dashed bg-sheet',
        over ? 'border-ink bg-well' : 'border-rule',
        slim ? 'flex flex-wrap items-center gap-3 px-4 py-2.5' : 'px-6 py-10 text-center',
      )}
    >
      {!slim && (
        <svg viewBox="0 0 220 70" className="pencil mx-auto mb-4 w-56 text-graphite" aria-hidden="true">
          {[0, 1, 2, 3, 4].map((frame) => (
            <g key={frame} transform={`translate(${frame * 44 + 2} 10)`}>
              <rect width="38" height="46" rx="4" className="fill-paper" />
              <circle cx="19" cy={38 - 26 * (1 - ((frame - 2) / 2) ** 2)} r="3.4" className="fill-ink" stroke="none" />
            </g>
          ))}
        </svg>
      )}
      <p className={slim ? 'text-sm text-graphite' : 'text-md font-semibold'}>
        {slim ? 'Drop more frames here, or' : 'Drop the frames here'}
      </p>
      {!slim && (
        <p className="mx-auto mt-1 mb-4 max-w-md text-sm text-graphite">
          A numbered set of PNG, JPEG or WebP pictures, the folder they lie in, or one picture that holds a row or a
          grid of frames.
        </p>
      )}
      <Button
        kind={slim ? 'plain' : 'primary'}
        size={slim ? 'small' : 'regular'}
        onClick={() => input.current?.click()}
      >
        Choose files
      </Button>
      <input
        ref={input}
        type="file"
        multiple
        accept="image/png,image/jpeg,image/webp"
        aria-label="Frames of the strip"
        tabIndex={-1}
        className="sr-only"
        onChange={(event) => {
          onFiles([...(event.target.files ?? [])]);
          // The same files may be chosen once more, after one was taken out.
          event.target.value = '';
        }}
      />
    </div>
  );
}
