import { readdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';

/**
 * Removes files that a killed process left half-written. Only names directly in the folder are looked at.
 * @param olderThanMs age below which a file may still be being written
 * @returns how many were removed
 */
export async function sweepTempFiles(folder: string, olderThanMs: number, nowMs: number): Promise<number> {
  const names = await readdir(folder).catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return [];
    throw error;
  });
  let removed = 0;
  for (const name of names) {
    const path = join(folder, name);
    const found = await stat(path).catch(() => null);
    if (!found?.isFile() || nowMs - found.mtimeMs < olderThanMs) continue;
    await rm(path, { force: true });
    removed += 1;
  }
  return removed;
}
