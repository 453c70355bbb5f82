import * as contracts from '../../shared/contracts/fit-reports.ts';
import { mayDo } from '../../shared/abilities/ability.ts';
import { answerConsent } from '../commands/fit-reports/answer-consent.ts';
import { answerFitReport } from '../commands/fit-reports/answer-fit-report.ts';
import { raiseFitReport } from '../commands/fit-reports/raise-fit-report.ts';
import * as steps from '../commands/fit-reports/report-steps.ts';
import { writeClientWords } from '../commands/fit-reports/write-client-words.ts';
import { FitReport } from '../entities/fit-report.ts';
import { NotPermitted } from '../errors.ts';
import type { Api } from '../http/api.ts';
import { authorize, authorizeCommissionSight } from '../policies/authorize.ts';
import { loadConsents } from '../queries/fit-reports/load-consents.ts';
import { loadReportDetail, loadVisibleReports } from '../queries/fit-reports/load-report.ts';

export function mountFitReports(api: Api): void {
  api.signedIn(contracts.listFitReports, (ctx, { params: { commissionId }, query }) => {
    authorizeCommissionSight(ctx.ability, commissionId);
    return loadVisibleReports(ctx.manager, ctx.ability, commissionId, query.open);
  });
  api.signedIn(contracts.getFitReport, async (ctx, { params: { commissionId, reportId } }) => {
    authorize(ctx.ability, 'read', 'FitReport', await ctx.manager.findOneBy(FitReport, { id: reportId, commissionId }));
    return loadReportDetail(ctx.manager, commissionId, reportId);
  });
  api.signedIn(contracts.raiseFitReport, raiseFitReport);
  api.signedIn(contracts.answerFitReport, answerFitReport);
  api.signedIn(contracts.agreeToRework, steps.agreeToRework);
  api.signedIn(contracts.askOtherLimits, steps.askOtherLimits);
  api.signedIn(contracts.startRework, steps.startRework);
  api.signedIn(contracts.finishRework, steps.finishRework);
  api.signedIn(contracts.verifyRework, steps.verifyRework);
  api.signedIn(contracts.withdrawFitReport, steps.withdrawFitReport);
  api.signedIn(contracts.writeClientWords, writeClientWords);
  api.signedIn(contracts.listConsents, (ctx, { params: { commissionId } }) => {
    authorizeCommissionSight(ctx.ability, commissionId);
    if (!mayDo(ctx.ability, 'read', 'Consent', { commissionId })) throw new NotPermitted();
    return loadConsents(ctx.manager, commissionId);
  });
  api.signedIn(contracts.answerConsent, answerConsent);
}
