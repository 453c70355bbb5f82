import { looksLikeUnitMixUp, parseLength } from '../../../shared/units/length.ts';
import type { addReadings as contract } from '../../../shared/contracts/joints.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import type { ProblemError } from '../../../shared/problems/problems.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { FitReport } from '../../entities/fit-report.ts';
import { Joint } from '../../entities/joint.ts';
import { Reading } from '../../entities/reading.ts';
import { InputInvalid } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { actingParty } from '../../policies/acting-party.ts';
import { authorize } from '../../policies/authorize.ts';
import { loadReadings, type ReadingRecord } from '../../queries/joints/load-joints.ts';

type Body = ParsedInput<typeof contract>['body'];

/** Every reading in mm by the shared parser, or every reason why one is none. */
function parseReadings(body: Body, nominalMm: number): number[] {
  const errors: ProblemError[] = [];
  const valuesMm = body.readings.map(({ text, unit }, index) => {
    const parsed = parseLength(text, unit);
    const pointer = `/body/readings/${index}/text`;
    if (!parsed.ok) errors.push({ pointer, message: parsed.message });
    else if (looksLikeUnitMixUp(parsed.valueMm, nominalMm))
      errors.push({ pointer, message: `${text} is far from the joint's ${nominalMm} mm; check the unit` });
    return parsed.ok ? parsed.valueMm : 0;
  });
  if (errors.length > 0) throw new InputInvalid(errors);
  return valuesMm;
}

/** Adds one set of readings of one side. The joint's row is locked, so that sets get their numbers one after another. */
export const addReadings = (
  ctx: RequestContext,
  { params, body }: ParsedInput<typeof contract>,
): Promise<ReadingRecord[]> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, jointId } = params;
    const joint = await uow.manager.findOne(Joint, {
      where: { id: jointId, commissionId },
      lock: { mode: 'pessimistic_write' },
    });
    authorize(ctx.ability, 'measure', 'Joint', joint);
    const valuesMm = parseReadings(body, joint.nominalMm);
    if (body.reportId && (await uow.manager.countBy(FitReport, { id: body.reportId, jointId })) === 0)
      throw new InputInvalid([{ pointer: '/body/reportId', message: 'This report is not about this joint' }]);
    const partyIds = [joint.holePartyId, joint.shaftPartyId];
    const { partyId } = actingParty(ctx.actor, commissionId, partyIds);
    const [{ next } = { next: 1 }] = await uow.manager.query<{ next: number }[]>(
      'SELECT COALESCE(max("set_number"), 0) + 1 AS next FROM "reading" WHERE "joint_id" = $1 AND "side" = $2',
      [jointId, body.side],
    );
    await uow.manager.insert(
      Reading,
      body.readings.map((reading, position) => ({
        jointId,
        position,
        partyId,
        reportId: body.reportId,
        side: body.side,
        setNumber: next,
        valueMm: valuesMm[position] ?? 0,
        enteredText: reading.text,
        enteredUnit: reading.unit,
        resolutionUm: body.resolutionUm,
        stationMm: reading.stationMm,
        angleDeg: reading.angleDeg,
        temperatureC: body.temperatureC,
        humidityPct: body.humidityPct,
        gauge: body.gauge,
        accountId: ctx.actor.accountId,
      })),
    );
    uow.record({
      commissionId,
      accountId: ctx.actor.accountId,
      subject: 'joint',
      subjectId: jointId,
      partyIds,
      words: `Measured the ${body.side === 'hole' ? 'bore' : 'spigot'} of ${joint.name}, ${body.readings.length} ${body.readings.length === 1 ? 'reading' : 'readings'}`,
    });
    uow.announce('joint.changed', { commissionId, jointId }, { to: 'parties', commissionId, partyIds });
    return (await loadReadings(uow.manager, jointId)).filter(
      (reading) => reading.side === body.side && reading.setNumber === next,
    );
  });
