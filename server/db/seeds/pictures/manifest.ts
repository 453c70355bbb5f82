import type { FilePurpose } from '../../../../shared/contracts/vocabulary.ts';

export interface DemoPicture {
  fileName: string;
  title: string;
  alt: string;
  pieceKey: 'salt-lantern' | 'heron' | 'second-winter' | 'cartographer';
  purpose: FilePurpose | 'drawing';
}

/** Pictures of the demo's pieces, drawn by the scripts beside `draw-pictures.ts`. */
export const DEMO_PICTURES: readonly DemoPicture[] = [];
