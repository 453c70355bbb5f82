import { mayDo, type AppAbility } from '../../shared/abilities/ability.ts';
import type { EntityManager } from 'typeorm';
import { FitReport } from '../entities/fit-report.ts';
import { ReworkNote } from '../entities/rework-note.ts';
import { Thread } from '../entities/thread.ts';
import { IsNull, Not } from 'typeorm';
import type { FilePlace } from '../../shared/contracts/vocabulary.ts';
import { NotFound, NotPermitted } from '../errors.ts';
import type { EventAudience } from '../outbox/audience.ts';
import { authorize } from './authorize.ts';

interface FileSpot {
  commissionId: string;
  place: FilePlace;
  placeId: string;
}

/** A client sees the pictures of a report whose rework they are asked about, and of no other. */
async function isAskedAbout(manager: EntityManager, ability: AppAbility, spot: FileSpot): Promise<boolean> {
  if (!mayDo(ability, 'read', 'Consent', { commissionId: spot.commissionId })) return false;
  return (await manager.countBy(ReworkNote, { reportId: spot.placeId, consentState: Not(IsNull()) })) > 0;
}

/**
 * Who may read a place may read its files. @throws NotFound when the place may not be seen
 * @param act `read`, or `picture` for adding a file
 */
export async function authorizeFilePlace(
  manager: EntityManager,
  ability: AppAbility,
  spot: FileSpot,
  act: 'read' | 'picture',
  purpose?: string,
): Promise<EventAudience> {
  const { commissionId, place, placeId } = spot;
  switch (place) {
    case 'thread': {
      const thread = await manager.findOneBy(Thread, { id: placeId, commissionId });
      authorize(ability, act === 'picture' ? 'post' : 'read', 'Thread', thread);
      return { to: 'thread', threadId: placeId };
    }
    case 'report': {
      const report = await manager.findOneBy(FitReport, { id: placeId, commissionId });
      if (act === 'read' && report && purpose === 'before' && (await isAskedAbout(manager, ability, spot)))
        return { to: 'parties', commissionId, partyIds: [] };
      authorize(ability, act, 'FitReport', report);
      return { to: 'parties', commissionId, partyIds: [report.raisedByPartyId, report.answerPartyId] };
    }
    case 'commission': {
      if (placeId !== commissionId || !mayDo(ability, 'read', 'Commission', { id: commissionId, memberKeys: [] }))
        throw new NotFound();
      const mayLook = mayDo(ability, 'picture', 'Commission', { id: commissionId, memberKeys: [] });
      if (!mayLook && (act === 'picture' || !mayDo(ability, 'read', 'Pictures', { commissionId })))
        throw new NotPermitted();
      return { to: 'everyone', commissionId };
    }
  }
}
