/** Something that keeps Spandrel from starting; the message is one sentence for the person at the terminal. */
export class StartupError extends Error {
  override readonly name = 'StartupError';
}

/**
 * The sentence for a failed write below a folder, or `undefined` when the error is of another kind.
 * Takes a Node error or the output of a program, because MariaDB's tools only speak in text.
 */
export function writeFault(cause: unknown, folder: string): StartupError | undefined {
  const text = cause instanceof Error ? `${(cause as NodeJS.ErrnoException).code} ${cause.message}` : String(cause);
  if (/ENOSPC|EDQUOT|No space left on device|\b(error|errno:?|number) 28\b/i.test(text)) {
    return new StartupError(`The disk that holds ${folder} is full; free some space or point DATA_DIR elsewhere.`);
  }
  if (
    /EACCES|EPERM|EROFS|ENOTDIR|EEXIST|Permission denied|Read-only file system|\b(error|errno:?|number) 13\b/i.test(
      text,
    )
  ) {
    return new StartupError(`${folder} cannot be written; allow it for this user or point DATA_DIR elsewhere.`);
  }
  return undefined;
}
