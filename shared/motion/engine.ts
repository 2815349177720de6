/** Version of the code that reads motion; written into every reading, so that an old reading can be told from a new one. */
export const ENGINE_VERSION = '1.0.0';
