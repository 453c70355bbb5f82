export type FileRefusedCode =
  | 'type-not-accepted'
  | 'empty'
  | 'too-large'
  | 'too-many'
  | 'form-too-large'
  | 'upload-broken'
  | 'image-unreadable'
  | 'image-too-large'
  | 'video-unreadable';

/** A file that was not taken. `words` go to its sender: what happened, what was kept, what to do. */
export class FileRefusedError extends Error {
  readonly code: FileRefusedCode;
  readonly words: string;

  constructor(code: FileRefusedCode, words: string, options?: ErrorOptions) {
    super(words, options);
    this.code = code;
    this.words = words;
  }
}
