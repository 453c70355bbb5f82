import type { EntityManager } from 'typeorm';
import { clientFactsFrom } from '../../../shared/engines/standing/client-facts-from.ts';
import type { ClientFacts } from '../../../shared/engines/standing/client-facts.ts';
import type { CommissionFacts } from '../../../shared/engines/standing/commission-facts.ts';
import { showCode } from '../../../shared/engines/codes/crockford.ts';
import { planOf, type Plan, type PlanInput } from '../../../shared/engines/schedule/plan.ts';
import { isWorkingDay, type IsoDay } from '../../../shared/units/calendar-day.ts';
import type { Commission } from '../../entities/commission.ts';
import { loadAllHandoffs, type HandoffRecord } from '../handoffs/load-handoffs.ts';
import { loadAllLegs, type LegRecord } from '../legs/load-legs.ts';

/** The commission's legs and handoffs as the plan engine takes them. */
export const planInputOf = (
  legs: readonly LegRecord[],
  handoffs: readonly HandoffRecord[],
  todayIso: IsoDay,
): PlanInput => ({
  legs: legs.map((leg) => ({ ...leg, heldSince: leg.heldBy?.sinceDay ?? null })),
  handoffs,
  todayIso,
  isWorkingDay,
});

interface PartyRow {
  id: string;
  name: string;
  craft: string;
  isClient: boolean;
}

type ReportRow = Omit<CommissionFacts['reports'][number], 'note'> & {
  note: NonNullable<CommissionFacts['reports'][number]['note']> | null;
};

const PARTIES_SQL = `
  SELECT p."id", COALESCE(s."name", a."display_name") AS name, COALESCE(s."craft", '') AS craft, 'client' = ANY(p."roles") AS "isClient"
  FROM "party" p LEFT JOIN "shop" s ON s."id" = p."shop_id" LEFT JOIN "account" a ON a."id" = p."account_id" WHERE p."commission_id" = $1`;

const REPORTS_SQL = `
  SELECT f."id", f."title", f."plain_words" AS "plainWords", f."state", f."blocking", f."held_leg_id" AS "heldLegId",
    f."raised_at"::date::text AS "raisedOn", f."raised_by_party_id" AS "raisedByPartyId", f."answer_party_id" AS "answerPartyId",
    f."client_words" AS "clientWords",
    (SELECT jsonb_build_object('id', n."id", 'agreed', n."state" IN ('agreed', 'done'), 'method', n."method", 'removeOnDiameterUm', n."remove_on_diameter_um",
        'risk', n."risk", 'shows', n."shows", 'costMinor', n."cost_minor", 'costBorneByPartyId', n."cost_borne_by_party_id",
        'consent', n."consent_state", 'consentAskedOn', n."consent_asked_at"::date::text)
      FROM "rework_note" n WHERE n."report_id" = f."id" ORDER BY n."created_at" DESC, n."id" DESC LIMIT 1) AS note
  FROM "fit_report" f WHERE f."commission_id" = $1`;

export interface LoadedFacts {
  all: CommissionFacts;
  plan: Plan;
  planInput: PlanInput;
}

/** Everything the merged status is computed from. Messages are not read: no status depends on them. */
export async function loadCommissionFacts(
  manager: EntityManager,
  commission: Commission,
  todayIso: IsoDay,
): Promise<LoadedFacts> {
  const { id } = commission;
  const [legs, handoffs, parties, parts, reports] = await Promise.all([
    loadAllLegs(manager, id),
    loadAllHandoffs(manager, id),
    manager.query<PartyRow[]>(PARTIES_SQL, [id]),
    manager.query<CommissionFacts['parts']>(
      `SELECT "id", "name", "position", "holder_party_id" AS "holderPartyId", "holder_since"::text AS "holderSince" FROM "part" WHERE "commission_id" = $1 ORDER BY "position", "id"`,
      [id],
    ),
    manager.query<ReportRow[]>(REPORTS_SQL, [id]),
  ]);
  const planInput = planInputOf(legs, handoffs, todayIso);
  const plan = planOf(planInput);
  const all: CommissionFacts = {
    title: commission.title,
    code: showCode(commission.code),
    brief: commission.brief,
    budgetMinor: commission.budgetMinor,
    deliveredOn: commission.deliveredOn,
    told:
      commission.toldFromDay && commission.toldToDay
        ? { fromDay: commission.toldFromDay, toDay: commission.toldToDay }
        : null,
    expected: plan.expected,
    parties,
    parts,
    legs: legs.map((leg) => ({
      ...leg,
      likelyStartOn: plan.legs.get(leg.id)?.startOn ?? null,
      likelyFinishOn: plan.legs.get(leg.id)?.finishOn ?? null,
    })),
    reports,
    handoffs: handoffs.map((handoff) => {
      const standing = handoff.offers.find((offer) => offer.state === 'standing');
      return {
        ...handoff,
        standingOffer: standing
          ? {
              byPartyId: standing.byPartyId,
              onDay: standing.onDay,
              words: standing.words,
              offeredOn: standing.at.slice(0, 10),
            }
          : null,
      };
    }),
    threads: [],
  };
  return { all, plan, planInput };
}

export const loadClientFacts = async (
  manager: EntityManager,
  commission: Commission,
  todayIso: IsoDay,
): Promise<ClientFacts> => clientFactsFrom((await loadCommissionFacts(manager, commission, todayIso)).all);
