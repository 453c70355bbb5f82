import type { FitReportDetail, writeClientWords as contract } from '../../../shared/contracts/fit-reports.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { FitReport } from '../../entities/fit-report.ts';
import { StaleRevision } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { loadReportDetail } from '../../queries/fit-reports/load-report.ts';
import { announceReport } from './report-act.ts';

/** The lead releases the words in which the client reads of a report. */
export const writeClientWords = (
  ctx: RequestContext,
  { params, body }: ParsedInput<typeof contract>,
): Promise<FitReportDetail> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, reportId } = params;
    const report = await uow.manager.findOne(FitReport, {
      where: { id: reportId, commissionId },
      lock: { mode: 'pessimistic_write' },
    });
    authorize(ctx.ability, 'word', 'FitReport', report);
    if (report.revision !== body.revision)
      throw new StaleRevision(await loadReportDetail(uow.manager, commissionId, reportId));
    report.clientWords = body.clientWords;
    report.revision += 1;
    await uow.manager.save(report);
    announceReport(uow, report);
    return loadReportDetail(uow.manager, commissionId, reportId);
  });
