import type { DayEffectView, previewHandoffDay as contract } from '../../../shared/contracts/handoffs.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { planOf, planWithDay } from '../../../shared/engines/schedule/plan.ts';
import { dayRange, daysBetween } from '../../../shared/units/calendar-day.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { loadAllLegs } from '../legs/load-legs.ts';
import { planInputOf } from '../standing/load-facts.ts';
import { loadAllHandoffs } from './load-handoffs.ts';

/** What a day would do to the client's date. Told to those who agree the day, before they do. */
export async function previewHandoffDay(
  ctx: RequestContext,
  { params, query }: ParsedInput<typeof contract>,
): Promise<DayEffectView> {
  const { commissionId, handoffId } = params;
  const [legs, handoffs] = [
    await loadAllLegs(ctx.manager, commissionId),
    await loadAllHandoffs(ctx.manager, commissionId),
  ];
  authorize(
    ctx.ability,
    'offer',
    'Handoff',
    handoffs.find((one) => one.id === handoffId),
  );
  const input = planInputOf(legs, handoffs, ctx.todayIso);
  const before = planOf(input).expected;
  const after = planWithDay(input, handoffId, query.onDay).expected;
  const movedDays = before && after ? daysBetween(before.toDay, after.toDay) : null;
  return { onDay: query.onDay, before, after, movedDays, words: effectWords(before, after, movedDays) };
}

function effectWords(before: DayEffectView['before'], after: DayEffectView['after'], movedDays: number | null): string {
  if (!before || !after || movedDays === null) return "No plan can be computed yet, so the client's date is not known.";
  const range = dayRange(after.fromDay, after.toDay);
  if (movedDays === 0) return `Keeps the client's date: likely ${range}.`;
  const size = Math.abs(movedDays);
  return `Moves the client's date by ${size === 1 ? 'one day' : `${size} days`} ${movedDays > 0 ? 'later' : 'earlier'}: likely ${range}, was ${dayRange(before.fromDay, before.toDay)}.`;
}
