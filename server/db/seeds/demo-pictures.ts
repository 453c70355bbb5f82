import { randomUUID } from 'node:crypto';
import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { EntityManager } from 'typeorm';
import type { FilePlace, FilePurpose } from '../../../shared/contracts/vocabulary.ts';
import { StoredFile } from '../../entities/stored-file.ts';
import { storePhotograph } from '../../commands/files/store-photograph.ts';
import type { ObjectStorage } from '../../integrations/storage/object-storage.ts';
import type { DemoPiece } from './demo-pieces.ts';
import { DEMO_PICTURES } from './pictures/manifest.ts';

interface Place {
  commissionId: string;
  place: FilePlace;
  placeId: string;
  purpose: FilePurpose;
  addedByAccountId: string;
  createdAt: Date;
}

const pathOf = (fileName: string): string => fileURLToPath(new URL(`./pictures/${fileName}`, import.meta.url));

/** Hands out the demo's pictures, each once per piece, and stores them as an upload would. */
export class DemoPictures {
  readonly #storage: ObjectStorage;
  readonly #taken = new Set<string>();

  constructor(storage: ObjectStorage) {
    this.#storage = storage;
  }

  /** The id of the stored picture; null when the piece has no picture left that would do. */
  async add(manager: EntityManager, pieceKey: DemoPiece['pictureKey'], place: Place): Promise<string | null> {
    const left = DEMO_PICTURES.filter(
      (picture) =>
        picture.pieceKey === pieceKey && !this.#taken.has(picture.fileName) && existsSync(pathOf(picture.fileName)),
    );
    const wanted = place.purpose === 'brief' ? 'drawing' : place.purpose;
    const picture = left.find((one) => one.purpose === wanted);
    if (!picture) return null;
    this.#taken.add(picture.fileName);
    const stored = await storePhotograph(this.#storage, pathOf(picture.fileName));
    const id = randomUUID();
    await manager.insert(StoredFile, { id, ...place, name: picture.fileName, caption: picture.title, ...stored });
    return id;
  }
}
