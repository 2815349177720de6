import clsx from 'clsx';
import type { ReactNode } from 'react';
import { useKeys } from '../../lib/keys.ts';
import { LAYER_NAMES, LAYERS, type Layer } from './layerChoice.ts';

/** What each layer looks like on the picture, small. */
const SAMPLES: Record<Layer, ReactNode> = {
  marks: <path d="M1 6h14" className="pencil" />,
  arc: <path d="M1 6h4m2 0h3m2 0h3" className="stroke-blueline" strokeWidth="2.4" />,
  findings: <path d="M2 6h12" className="stroke-redline" strokeWidth="5" strokeLinecap="round" opacity="0.75" />,
  ladders: <path d="M1 9.5h14M2 9.5v-7M6 9.5v-7M9.5 9.5v-7M12 9.5v-7M14 9.5v-7" className="pencil" strokeWidth="1.3" />,
  quarter: (
    <path d="M1 2.5h14M1 5h14M1 10.5h14" className="stroke-blueline" strokeWidth="1.3" strokeDasharray="2 1.5" />
  ),
  under: (
    <>
      <circle cx="5" cy="6" r="3.4" className="pencil" strokeWidth="1.2" opacity="0.45" />
      <circle cx="11" cy="6" r="3.4" className="pencil" strokeWidth="1.4" />
    </>
  ),
  numbers: <path d="M3 3l2-1v8M9 4c0-3 5-3 5 0 0 2-5 3-5 6h5" className="pencil" strokeWidth="1.3" />,
};

function LayerSwitch({
  layer,
  on,
  onSwitch,
  hasReading,
}: {
  layer: Layer;
  on: boolean;
  onSwitch: () => void;
  hasReading: boolean;
}) {
  return (
    <button
      type="button"
      aria-pressed={on}
      disabled={!hasReading}
      title={`${LAYER_NAMES[layer]} (${LAYERS.indexOf(layer) + 1})`}
      onClick={onSwitch}
      className={clsx(
        'inline-flex min-h-7 shrink-0 items-center gap-1.5 rounded-control border px-2 text-xs font-medium whitespace-nowrap touch:min-h-11 touch:px-3',
        'disabled:opacity-55',
        on ? 'border-rule bg-sheet text-ink' : 'border-dashed border-rule bg-transparent text-graphite hover:text-ink',
      )}
    >
      <svg viewBox="0 0 16 12" className="h-3 w-4" aria-hidden="true">
        {SAMPLES[layer]}
      </svg>
      {LAYER_NAMES[layer]}
    </button>
  );
}

export interface PegBarProps {
  layers: ReadonlySet<Layer>;
  onSwitch: (layer: Layer) => void;
  hasReading: boolean;
  /** Play and the frame's number, at the right end. */
  children: ReactNode;
}

const AT_LEFT = LAYERS.slice(0, 4);
const AT_RIGHT = LAYERS.slice(4);

/** The bar with the three pegs: the layers over the picture, each on and off, and Play. */
export function PegBar({ layers, onSwitch, hasReading, children }: PegBarProps) {
  useKeys(
    'Layers',
    LAYERS.map((layer, index) => ({
      key: String(index + 1),
      says: `${LAYER_NAMES[layer]} on or off`,
      run: () => hasReading && onSwitch(layer),
    })),
  );
  const switches = (some: readonly Layer[]) =>
    some.map((layer) => (
      <LayerSwitch
        key={layer}
        layer={layer}
        hasReading={hasReading}
        on={layers.has(layer)}
        onSwitch={() => onSwitch(layer)}
      />
    ));
  return (
    <div className="flex min-h-10 items-center border-b border-dashed border-rule">
      <fieldset
        aria-label="Layers over the picture"
        className="flex min-w-0 flex-1 items-center gap-1.5 overflow-x-auto px-3 py-1 [scrollbar-width:none]"
      >
        {switches(AT_LEFT)}
        <span className="flex min-w-0 flex-1 items-center justify-center gap-[14%] max-xl:hidden" aria-hidden="true">
          <i className="h-1.5 w-7 rounded-full bg-well inset-shadow-2xs" />
          <i className="size-2.5 rounded-full bg-well inset-shadow-2xs" />
          <i className="h-1.5 w-7 rounded-full bg-well inset-shadow-2xs" />
        </span>
        {switches(AT_RIGHT)}
      </fieldset>
      <div className="flex shrink-0 items-center gap-2.5 py-1 pr-3 pl-1">{children}</div>
    </div>
  );
}
