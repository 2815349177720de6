import { describe, expect, it } from 'vitest';
import {
  DEFAULT_LAYERS,
  layersFromAddress,
  layersToAddress,
  switchLayer,
} from '../../../src/features/layers/layerChoice.ts';

describe('layers in the address', () => {
  it('say nothing when they are the usual ones', () => {
    expect(layersFromAddress(null)).toEqual(DEFAULT_LAYERS);
    expect(layersToAddress(DEFAULT_LAYERS)).toBeNull();
  });

  it('come back as they were written, in the order of the peg bar', () => {
    expect(layersToAddress(layersFromAddress('arc,marks'))).toBe('marks,arc');
    expect(layersFromAddress('none').size).toBe(0);
    expect(layersToAddress(new Set())).toBe('none');
  });

  it('pass over words that name no layer', () => {
    expect([...layersFromAddress('marks,ghost,<b>')]).toEqual(['marks']);
  });

  it('switch one at a time', () => {
    const without = switchLayer(DEFAULT_LAYERS, 'arc');
    expect(without.has('arc')).toBe(false);
    expect(switchLayer(without, 'arc')).toEqual(DEFAULT_LAYERS);
  });
});
