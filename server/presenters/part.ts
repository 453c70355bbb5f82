import type { PartView } from '../../shared/contracts/parts-and-legs.ts';
import type { Part } from '../entities/part.ts';

export const presentPart = (row: Part): PartView => ({
  id: row.id,
  name: row.name,
  kind: row.kind,
  holderPartyId: row.holderPartyId,
  holderSince: row.holderSince,
  position: row.position,
  revision: row.revision,
});
