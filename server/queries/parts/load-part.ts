import { In, type EntityManager } from 'typeorm';
import { Part } from '../../entities/part.ts';
import { InputInvalid } from '../../errors.ts';

/** Checks that named parts are of the commission; the pointer names the field of one that is not. */
export async function requireParts(
  manager: EntityManager,
  commissionId: string,
  wanted: readonly [pointer: string, partId: string][],
): Promise<Map<string, Part>> {
  const rows = await manager.findBy(Part, { commissionId, id: In([...new Set(wanted.map(([, id]) => id))]) });
  const byId = new Map(rows.map((row) => [row.id, row]));
  const errors = wanted
    .filter(([, id]) => !byId.has(id))
    .map(([pointer]) => ({ pointer, message: 'This part is not of this commission' }));
  if (errors.length > 0) throw new InputInvalid(errors);
  return byId;
}
