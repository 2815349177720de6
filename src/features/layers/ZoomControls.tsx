import clsx from 'clsx';
import { shownNumber } from '../../lib/honestDigits.ts';
import type { ViewControl } from './useView.ts';

const BUTTON =
  'relative inline-flex min-h-7 min-w-7 items-center justify-center rounded-control border border-rule bg-sheet px-1.5 font-mono text-xs font-semibold whitespace-nowrap text-ink hover:border-graphite disabled:opacity-55 touch:min-w-10 touch:before:absolute touch:before:-inset-x-1 touch:before:-inset-y-2.5';

/** Closer, further away, the whole picture; on the surround. */
export function ZoomControls({ control, onZoom }: { control: ViewControl; onZoom: (factor: number) => void }) {
  return (
    <fieldset aria-label="Zoom" className="absolute bottom-2 left-2 flex gap-1 touch:gap-2.5">
      <button
        type="button"
        className={clsx(BUTTON, control.fitted && 'max-md:hidden')}
        aria-label="Further away"
        disabled={control.fitted}
        onClick={() => onZoom(1 / 1.5)}
      >
        −
      </button>
      <button type="button" className={BUTTON} aria-label="Closer" onClick={() => onZoom(1.5)}>
        +
      </button>
      {!control.fitted && (
        <button type="button" className={BUTTON} onClick={control.fit}>
          Whole picture{' '}
          <span className="ml-1.5 font-normal text-graphite">{shownNumber(control.view.scale * 100, 0)} %</span>
        </button>
      )}
    </fieldset>
  );
}
