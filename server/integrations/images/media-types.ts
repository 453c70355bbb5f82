export type MediaKind = 'image' | 'video' | 'audio' | 'text' | 'document' | 'archive' | 'model';

interface MediaFacts {
  readonly kind: MediaKind;
  /** Ending of a downloaded file, without the dot; the first is written, all are left as they are. */
  readonly extensions: readonly [string, ...string[]];
}

/** Everything that is taken in, by media type. SVG and HTML are not here: both are programs in a reader's browser. */
export const ACCEPTED_MEDIA: Readonly<Record<string, MediaFacts>> = {
  'image/jpeg': { kind: 'image', extensions: ['jpg', 'jpeg'] },
  'image/png': { kind: 'image', extensions: ['png'] },
  'image/webp': { kind: 'image', extensions: ['webp'] },
  'image/avif': { kind: 'image', extensions: ['avif'] },
  'image/gif': { kind: 'image', extensions: ['gif'] },
  'video/mp4': { kind: 'video', extensions: ['mp4', 'm4v'] },
  'video/quicktime': { kind: 'video', extensions: ['mov'] },
  'video/webm': { kind: 'video', extensions: ['webm'] },
  'audio/wav': { kind: 'audio', extensions: ['wav'] },
  'audio/ogg': { kind: 'audio', extensions: ['ogg', 'oga', 'opus'] },
  'audio/mpeg': { kind: 'audio', extensions: ['mp3'] },
  'application/pdf': { kind: 'document', extensions: ['pdf'] },
  'application/zip': { kind: 'archive', extensions: ['zip'] },
  'model/stl': { kind: 'model', extensions: ['stl'] },
  'application/json': { kind: 'text', extensions: ['json'] },
  'text/csv': { kind: 'text', extensions: ['csv', 'txt'] },
  // Board configurations and part programs are plain text under many endings.
  'text/plain': {
    kind: 'text',
    extensions: [
      'txt',
      'text',
      'md',
      'log',
      'ini',
      'cfg',
      'conf',
      'h',
      'c',
      'cpp',
      'ino',
      'gcode',
      'nc',
      'csv',
      'json',
      'yaml',
      'yml',
      'toml',
      'step',
      'stp',
      'dxf',
    ],
  },
};

/** Shown in the page itself. The rest, PDF too, is only ever saved: a reader's browser runs none of it in our name. */
const INLINE = new Set([
  'image/webp',
  'video/mp4',
  'video/quicktime',
  'video/webm',
  'audio/wav',
  'audio/ogg',
  'audio/mpeg',
]);

export const isShownInline = (mediaType: string): boolean => INLINE.has(mediaType);
