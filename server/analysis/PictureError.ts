/** Why a file cannot be used. */
export type PictureErrorCode =
  | 'empty_file'
  | 'not_a_picture'
  | 'unsupported_format'
  | 'animated_picture'
  | 'picture_too_large'
  | 'picture_too_small'
  | 'damaged_picture'
  | 'size_differs'
  | 'unreadable_file'
  | 'no_grid';

/** A file that cannot be used as a picture. The message is one sentence that names the file and the reason. */
export class PictureError extends Error {
  readonly file: string;
  readonly code: PictureErrorCode;

  constructor(file: string, code: PictureErrorCode, message: string) {
    super(message);
    this.name = 'PictureError';
    this.file = file;
    this.code = code;
  }
}
