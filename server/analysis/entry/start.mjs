import { workerData } from 'node:worker_threads';
import { register } from 'tsx/esm/api';

// A worker cannot count on its parent's loader: vitest has none to inherit. So it starts here, in plain JavaScript,
// and loads the TypeScript entry itself. The pool says which in the second part of the data it hands over.
register();
const [, { entry }] = workerData;

/** @param {import('../messages.ts').AnalysisTask} task */
export async function analyse(task) {
  const module = await import(entry);
  return module.analyse(task);
}
