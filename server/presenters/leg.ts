import { LEG_FIELDS, mayDo, type AppAbility } from '../../shared/abilities/ability.ts';
import type { LegView } from '../../shared/contracts/parts-and-legs.ts';
import type { LegRecord } from '../queries/legs/load-legs.ts';
import { fieldsFor, pickFields } from './pick-fields.ts';

const FIELDS = Object.values(LEG_FIELDS).flat();

/** Who may not read the report learns that the leg is held, and no more. */
function presentHold(ability: AppAbility, leg: LegRecord): LegView['held'] {
  if (!leg.heldBy) return null;
  const { reportId, title, sinceDay, raisedByPartyId, answerPartyId } = leg.heldBy;
  const mayRead = mayDo(ability, 'read', 'FitReport', {
    commissionId: leg.commissionId,
    raisedByPartyId,
    answerPartyId,
  });
  return mayRead ? { sinceDay, reportId, title } : { sinceDay };
}

export function presentLeg(ability: AppAbility, leg: LegRecord): LegView {
  const full: LegView = {
    id: leg.id,
    partyId: leg.partyId,
    partId: leg.partId,
    kind: leg.kind,
    title: leg.title,
    state: leg.state,
    plannedStartOn: leg.plannedStartOn,
    startedOn: leg.startedOn,
    finishedOn: leg.finishedOn,
    afterLegIds: leg.afterLegIds,
    position: leg.position,
    revision: leg.revision,
    held: presentHold(ability, leg),
    hopefulDays: leg.hopefulDays,
    likelyDays: leg.likelyDays,
    badDays: leg.badDays,
    privateNote: leg.privateNote,
  };
  return pickFields(full, fieldsFor(ability, 'read', 'Leg', leg, FIELDS));
}
