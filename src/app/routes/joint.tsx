import { useSuspenseQuery } from '@tanstack/react-query';
import { Link, useNavigate } from 'react-router-dom';
import { mayDo } from '../../../shared/abilities/ability.ts';
import { TwoColumns } from '../../components/ui/page.tsx';
import { Fold } from '../../components/ui/fold.tsx';
import { Sheet } from '../../components/ui/sheet.tsx';
import { RaiseForm } from '../../features/fit-reports/components/raise-form.tsx';
import { FitSheet } from '../../features/joints/components/fit-sheet.tsx';
import { ownSideOf } from '../../features/joints/own-side.ts';
import { ReadingEntry } from '../../features/joints/components/reading-entry.tsx';
import { ReadingsTable } from '../../features/joints/components/readings-table.tsx';
import { EditJoint } from '../../features/plan/components/joint-form.tsx';
import { useSight } from '../../hooks/use-membership.ts';
import { usePartyBook } from '../../hooks/use-party-names.ts';
import { commissionQueries } from '../../lib/queries/commissions.ts';
import { jointQueries } from '../../lib/queries/joints.ts';
import { meQuery } from '../../lib/queries/me.ts';
import { SIDE_WORDS } from '../../lib/words.ts';
import { usePathId } from '../use-path-id.ts';
import { SubjectThreads } from '../subject-threads.tsx';

export function Component() {
  const commissionId = usePathId('commissionId');
  const jointId = usePathId('jointId');
  const navigate = useNavigate();
  const { data: me } = useSuspenseQuery(meQuery());
  const { data } = useSuspenseQuery(jointQueries.detail(commissionId, jointId));
  const { data: legs } = useSuspenseQuery(commissionQueries.legs(commissionId));
  const { data: parts } = useSuspenseQuery(commissionQueries.parts(commissionId));
  const { parties } = usePartyBook(commissionId);
  const { ability, mine } = useSight(commissionId);
  const { joint, readings } = data;
  const facts = { commissionId, holePartyId: joint.holePartyId, shaftPartyId: joint.shaftPartyId };
  const ownFirst = [...legs].sort((one, other) => Number(mine.has(other.partyId)) - Number(mine.has(one.partyId)));
  return (
    <TwoColumns
      main={
        <div className="grid gap-5">
          <FitSheet joint={joint} readings={readings} unit={me.preferredUnit} />
          {mayDo(ability, 'measure', 'Joint', facts) && (
            <Sheet title="Enter readings" note="A caliper that types works: value, Enter, next field">
              <ReadingEntry
                commissionId={commissionId}
                jointId={jointId}
                nominalMm={joint.nominalMm}
                sideNames={SIDE_WORDS[joint.kind]}
                preferredUnit={me.preferredUnit}
                reportId={joint.openReportId}
                ownSide={ownSideOf(joint, mine)}
              />
            </Sheet>
          )}
          <ReadingsTable joint={joint} readings={readings} unit={me.preferredUnit} />
        </div>
      }
      side={
        <div className="grid gap-5">
          {joint.note && (
            <Sheet title="What was agreed">
              <p className="max-w-words whitespace-pre-line">{joint.note}</p>
            </Sheet>
          )}
          {joint.openReportId ? (
            <Sheet title="An open report stands on this joint">
              <Link className="underline" to={`/commissions/${commissionId}/reports/${joint.openReportId}`}>
                Open the report
              </Link>
            </Sheet>
          ) : (
            mayDo(ability, 'raise', 'Joint', facts) && (
              <Sheet title="It does not go together" note="Raise a fit report; readings and photographs can follow">
                <RaiseForm
                  commissionId={commissionId}
                  jointId={jointId}
                  legs={ownFirst}
                  onRaised={(reportId) => void navigate(`/commissions/${commissionId}/reports/${reportId}`)}
                />
              </Sheet>
            )
          )}
          {mayDo(ability, 'update', 'Joint', facts) && (
            <Sheet title="Change the joint" note="What it is, and the fit that was agreed">
              <Fold summary="Open the form">
                <EditJoint choices={{ commissionId, parties, parts }} joint={joint} />
              </Fold>
            </Sheet>
          )}
          <SubjectThreads
            commissionId={commissionId}
            subject="joint"
            subjectId={jointId}
            title={joint.name}
            partyIds={[joint.holePartyId, joint.shaftPartyId]}
          />
        </div>
      }
    />
  );
}
