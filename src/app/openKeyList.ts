const listeners = new Set<() => void>();

/** Opens the list of keys from a menu, also when single keys are switched off. */
export function openKeyList(): void {
  listeners.forEach((listener) => listener());
}

/** Listens for the list of keys being asked for; answers with what ends it. */
export function onOpenKeyList(listener: () => void): () => void {
  listeners.add(listener);
  return () => {
    listeners.delete(listener);
  };
}
