import { randomUUID } from 'node:crypto';
import { Invitation } from '../../server/entities/invitation.ts';
import { StoredFile } from '../../server/entities/stored-file.ts';
import { newObjectKey } from '../../server/integrations/storage/object-storage.ts';
import type { TestApp } from './test-app.ts';

/** Acts that use up what they are done to; the table needs it back before the next role asks. */
export const USES_UP: ReadonlySet<string> = new Set(['withdrawInvitation', 'withdrawShopInvitation', 'removeFile']);

export interface Consumables {
  commissionId: string;
  shopId: string | null;
  threadId: string;
  fileId: string;
  invitationId: string;
  shopInvitationId: string;
  /** Who sent the file. */
  accountId: string;
  invitedByAccountId: string;
}

/** Puts the invitations and the file of one target there, or back there. */
export async function putConsumables(app: TestApp, target: Consumables): Promise<void> {
  const { manager } = app.services.db;
  const { commissionId, shopId } = target;
  const letter = {
    guestSees: [],
    invitedByAccountId: target.invitedByAccountId,
    expiresAt: new Date(Date.now() + 86_400_000),
    withdrawnAt: null,
  };
  await manager.save(Invitation, [
    {
      ...letter,
      id: target.invitationId,
      email: `${target.invitationId}@x.test`,
      tokenHash: randomUUID(),
      commissionId,
      roles: ['maker'],
      shopId: null,
      shopRole: null,
    },
    {
      ...letter,
      id: target.shopInvitationId,
      email: `${target.shopInvitationId}@x.test`,
      tokenHash: randomUUID(),
      commissionId: null,
      roles: [],
      shopId,
      shopRole: 'hand',
    },
  ]);
  const storageKey = newObjectKey();
  await app.services.storage.put({ bytes: Buffer.from('hello') }, storageKey, { mediaType: 'text/plain' });
  await manager.save(StoredFile, {
    id: target.fileId,
    commissionId,
    place: 'thread',
    placeId: target.threadId,
    purpose: 'message',
    name: 'note.txt',
    mediaType: 'text/plain',
    byteSize: '5',
    sha256: 'x',
    storageKey,
    renditions: null,
    addedByAccountId: target.accountId,
  });
}
