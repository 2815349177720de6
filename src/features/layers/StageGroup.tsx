import type { ReactNode } from 'react';
import type { Reading } from '../../../shared/reading/document.ts';
import { type Playhead, useFrame } from '../../lib/playhead.ts';
import { cameraAt } from '../../lib/stage.ts';

interface StageGroupProps {
  camera: Reading['camera'];
  playhead: Playhead;
  /** A ladder runs along one side of the picture and moves along that side only. */
  along?: 'across' | 'up';
  children: ReactNode;
}

function MovedGroup({ camera, playhead, along, children }: StageGroupProps) {
  const { dx, dy, zoom } = cameraAt(camera, useFrame(playhead));
  const across = along === 'up' ? [1, 0] : [zoom, -dx * zoom];
  const up = along === 'across' ? [1, 0] : [zoom, -dy * zoom];
  return <g transform={`matrix(${across[0]} 0 0 ${up[0]} ${across[1]} ${up[1]})`}>{children}</g>;
}

/** What is drawn on the stage, laid over the picture of the chosen frame as its camera saw it. */
export function StageGroup(props: StageGroupProps) {
  return props.camera.moved ? <MovedGroup {...props} /> : props.children;
}
