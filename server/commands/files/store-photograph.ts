import { makeRenditions } from '../../integrations/images/renditions.ts';
import { newObjectKey, type ObjectStorage } from '../../integrations/storage/object-storage.ts';
import type { StoredFile, StoredRendition } from '../../entities/stored-file.ts';

export type StoredBytes = Pick<
  StoredFile,
  'mediaType' | 'byteSize' | 'sha256' | 'storageKey' | 'renditions' | 'width' | 'height'
>;

/**
 * Stores a photograph in its sizes: upright, and without anything the camera wrote into it. The original is not kept,
 * since it may carry the place where it was taken.
 *
 * @throws FileRefusedError where it cannot be read as a picture; then nothing is stored
 */
export async function storePhotograph(storage: ObjectStorage, filePath: string): Promise<StoredBytes> {
  const made = await makeRenditions(filePath);
  const renditions: Record<string, StoredRendition> = {};
  try {
    for (const [size, one] of Object.entries(made)) {
      const key = newObjectKey();
      await storage.put({ bytes: one.bytes }, key, { mediaType: one.mediaType, byteSize: one.byteSize });
      renditions[size] = { key, byteSize: one.byteSize, width: one.width, height: one.height, sha256: one.sha256 };
    }
  } catch (error) {
    await Promise.all(Object.values(renditions).map(({ key }) => storage.remove(key)));
    throw error;
  }
  const { full } = made;
  return {
    mediaType: full.mediaType,
    byteSize: String(full.byteSize),
    sha256: full.sha256,
    storageKey: renditions['full']?.key ?? '',
    renditions,
    width: full.width,
    height: full.height,
  };
}
