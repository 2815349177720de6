/** The input of the command cannot be used: the message is one sentence that says why and what to do. */
export class InputError extends Error {
  override readonly name = 'InputError';
}
