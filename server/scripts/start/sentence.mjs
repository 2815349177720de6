/** What keeps Spandrel from starting, in one sentence; the plain twin of StartupError, for the time before TypeScript runs. */
export function startupError(message) {
  return Object.assign(new Error(message), { name: 'StartupError' });
}
