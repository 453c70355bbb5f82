import { IsNull, MoreThan, type EntityManager } from 'typeorm';
import { Invitation } from '../../entities/invitation.ts';
import { AppError } from '../../errors.ts';
import { hashToken } from '../../security/tokens.ts';

/** The invitation behind a link, while it can still be taken. @param lock takes the row for the rest of the transaction */
export async function findInvitation(
  manager: EntityManager,
  token: string,
  now: Date,
  lock = false,
): Promise<Invitation> {
  const row = await manager.findOne(Invitation, {
    where: { tokenHash: hashToken(token), acceptedAt: IsNull(), withdrawnAt: IsNull(), expiresAt: MoreThan(now) },
    ...(lock ? { lock: { mode: 'pessimistic_write' as const } } : {}),
  });
  if (!row) throw new AppError('link-expired', 'Ask for a new invitation; each link works once, for 14 days.');
  return row;
}

/** A shop is asked for when the invitation is for work: clients and guests come as themselves. */
export const needsShop = (invitation: Invitation): boolean =>
  invitation.commissionId !== null && !invitation.roles.includes('client') && !invitation.roles.includes('guest');
