/** What has to be undone at the end, last thing first. */
export interface Cleanup {
  add(undo: () => Promise<void>): void;
  /** Undoes everything, also when one step fails; that failure is reported and the rest goes on. */
  run(): Promise<void>;
}

/** @param report takes the failure of a step. */
export function createCleanup(report: (error: unknown) => void): Cleanup {
  const steps: (() => Promise<void>)[] = [];
  return {
    add: (undo) => void steps.push(undo),
    async run() {
      for (let undo = steps.pop(); undo; undo = steps.pop()) await undo().catch(report);
    },
  };
}
