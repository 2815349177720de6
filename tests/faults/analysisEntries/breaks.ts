import type { AnalysisTask } from '../../../server/analysis/messages.ts';

/** A worker that breaks in the way it is told to. */
export async function analyse({ request }: AnalysisTask): Promise<unknown> {
  const [how] = request.framePaths;
  if (how === 'exit') process.exit(3);
  if (how === 'throw') throw new Error('broken on purpose');
  if (how === 'memory') {
    const kept: number[][] = [];
    for (;;) kept.push(Array.from({ length: 1e5 }, Math.random));
  }
  return { ok: true, result: { reading: {} } };
}
