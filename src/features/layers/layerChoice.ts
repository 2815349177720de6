/** The layers over the picture, in the order of the peg bar; their keys are 1 to 7. */
export const LAYERS = ['marks', 'arc', 'findings', 'ladders', 'quarter', 'under', 'numbers'] as const;
export type Layer = (typeof LAYERS)[number];

export const LAYER_NAMES: Record<Layer, string> = {
  marks: 'Marks',
  arc: 'True arc',
  findings: 'Findings',
  ladders: 'Ladders',
  quarter: 'Quarter drop',
  under: 'Drawings under',
  numbers: 'Numbers',
};

export const DEFAULT_LAYERS: ReadonlySet<Layer> = new Set(['marks', 'arc', 'findings', 'ladders', 'numbers']);

/** The layers of an address such as `layers=marks,arc`; `none` for a bare picture, nothing for the usual ones. Words it does not know are passed over. */
export function layersFromAddress(value: string | null): ReadonlySet<Layer> {
  if (value === null) return DEFAULT_LAYERS;
  const words = value.split(',');
  return new Set(LAYERS.filter((layer) => words.includes(layer)));
}

/** What stands in the address for these layers; null for the usual ones, which need no saying. */
export function layersToAddress(layers: ReadonlySet<Layer>): string | null {
  const usual = layers.size === DEFAULT_LAYERS.size && [...layers].every((layer) => DEFAULT_LAYERS.has(layer));
  if (usual) return null;
  return layers.size === 0 ? 'none' : LAYERS.filter((layer) => layers.has(layer)).join(',');
}

/** The layers with one of them switched. */
export function switchLayer(layers: ReadonlySet<Layer>, layer: Layer): ReadonlySet<Layer> {
  return new Set(LAYERS.filter((candidate) => layers.has(candidate) !== (candidate === layer)));
}
