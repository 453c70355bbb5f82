import { useSuspenseQuery } from '@tanstack/react-query';
import { mayDo } from '../../../shared/abilities/ability.ts';
import { openReportActs } from '../../../shared/engines/reports/report-states.ts';
import { TwoColumns } from '../../components/ui/page.tsx';
import { Sheet } from '../../components/ui/sheet.tsx';
import { AnswerForm } from '../../features/fit-reports/components/answer-form.tsx';
import { NoteSheet } from '../../features/fit-reports/components/note-sheet.tsx';
import { ReportActs } from '../../features/fit-reports/components/report-acts.tsx';
import { ClientWords, ReportHead } from '../../features/fit-reports/components/report-head.tsx';
import { FitSheet } from '../../features/joints/components/fit-sheet.tsx';
import { ownSideOf } from '../../features/joints/own-side.ts';
import { ReadingEntry } from '../../features/joints/components/reading-entry.tsx';
import { fitOfJoint } from '../../features/joints/fit-of-joint.ts';
import { PictureWall } from '../../features/pictures/components/picture-wall.tsx';
import { useSight } from '../../hooks/use-membership.ts';
import { usePartyBook } from '../../hooks/use-party-names.ts';
import { commissionQueries } from '../../lib/queries/commissions.ts';
import { jointQueries, reportQueries } from '../../lib/queries/joints.ts';
import { meQuery } from '../../lib/queries/me.ts';
import { SIDE_WORDS } from '../../lib/words.ts';
import { SubjectThreads } from '../subject-threads.tsx';
import { usePathId } from '../use-path-id.ts';

export function Component() {
  const commissionId = usePathId('commissionId');
  const reportId = usePathId('reportId');
  const { data: me } = useSuspenseQuery(meQuery());
  const { data: detail } = useSuspenseQuery(reportQueries.detail(commissionId, reportId));
  const { report, notes } = detail;
  const { data } = useSuspenseQuery(jointQueries.detail(commissionId, report.jointId));
  const { data: commission } = useSuspenseQuery(commissionQueries.detail(commissionId));
  const { data: legs } = useSuspenseQuery(commissionQueries.legs(commissionId));
  const { ability, mine } = useSight(commissionId);
  const { nameOf } = usePartyBook(commissionId);
  const { joint, readings } = data;
  const sideNames = SIDE_WORDS[joint.kind];
  const facts = { commissionId, raisedByPartyId: report.raisedByPartyId, answerPartyId: report.answerPartyId };
  const latest = notes.at(-1);
  const open = openReportActs({
    state: report.state,
    shows: latest?.shows ?? false,
    consent: latest?.consent?.state ?? null,
  });
  const fit = fitOfJoint(joint, readings);
  const mayAnswer = open.includes('answer') && mayDo(ability, 'answer', 'FitReport', facts);
  const mayMeasure = mayDo(ability, 'measure', 'Joint', {
    commissionId,
    holePartyId: joint.holePartyId,
    shaftPartyId: joint.shaftPartyId,
  });
  const isOpen = report.state !== 'closed' && report.state !== 'withdrawn';
  return (
    <TwoColumns
      main={
        <div className="grid gap-5">
          <ReportHead
            detail={detail}
            nameOf={nameOf}
            legTitle={legs.find((leg) => leg.id === report.heldLegId)?.title ?? null}
          />
          {notes.map((note) => (
            <NoteSheet key={note.id} note={note} nameOf={nameOf} sideNames={sideNames} unit={me.preferredUnit} />
          ))}
          <ReportActs commissionId={commissionId} detail={detail} />
          <FitSheet joint={joint} readings={readings} unit={me.preferredUnit} />
          {mayAnswer && (
            <Sheet title={report.state === 'answered' ? 'Answer anew' : 'Answer with a rework note'}>
              <AnswerForm
                commissionId={commissionId}
                detail={detail}
                sideNames={sideNames}
                currency={commission.currency ?? 'EUR'}
                mine={mine}
                suggestedUm={fit.removal && fit.removal.onDiameterUm > 0 ? fit.removal.onDiameterUm : null}
                suggestedOverMm={joint.hiddenLengthMm}
              />
            </Sheet>
          )}
          {mayMeasure && isOpen && (
            <Sheet title="Enter readings">
              <ReadingEntry
                commissionId={commissionId}
                jointId={joint.id}
                nominalMm={joint.nominalMm}
                sideNames={sideNames}
                preferredUnit={me.preferredUnit}
                reportId={report.id}
                ownSide={ownSideOf(joint, mine)}
              />
            </Sheet>
          )}
        </div>
      }
      side={
        <div className="grid gap-5">
          <PictureWall
            commissionId={commissionId}
            place="report"
            placeId={report.id}
            title="Before and after"
            purposes={isOpen && mayDo(ability, 'picture', 'FitReport', facts) ? ['before', 'after'] : []}
          />
          <SubjectThreads
            commissionId={commissionId}
            subject="report"
            subjectId={report.id}
            title={report.title}
            partyIds={[report.raisedByPartyId, report.answerPartyId]}
          />
          {mayDo(ability, 'word', 'FitReport', facts) && <ClientWords commissionId={commissionId} detail={detail} />}
        </div>
      }
    />
  );
}
