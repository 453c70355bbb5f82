import { useSuspenseQuery } from '@tanstack/react-query';
import { mayDo } from '../../../shared/abilities/ability.ts';
import { TwoColumns } from '../../components/ui/page.tsx';
import { Fold } from '../../components/ui/fold.tsx';
import { Sheet } from '../../components/ui/sheet.tsx';
import { LegActs, OpenHandoffs, WhoHasWhat } from '../../features/commissions/components/rooms.tsx';
import { LegsSheet } from '../../features/plan/components/legs-sheet.tsx';
import { AddHandoff } from '../../features/plan/components/handoff-form.tsx';
import { AddJoint } from '../../features/plan/components/joint-form.tsx';
import { AddLeg } from '../../features/plan/components/leg-form.tsx';
import { AddPart, EditPart } from '../../features/plan/components/part-form.tsx';
import { useSight } from '../../hooks/use-membership.ts';
import { usePartyBook } from '../../hooks/use-party-names.ts';
import { ownProblem } from '../../lib/api.ts';
import { commissionQueries } from '../../lib/queries/commissions.ts';
import { todayIn } from '../../lib/today.ts';
import { usePathId } from '../use-path-id.ts';

export function Component() {
  const commissionId = usePathId('commissionId');
  const { ability, mine } = useSight(commissionId);
  const works = mayDo(ability, 'read', 'Leg', { commissionId, partyId: '' });
  if (!works) throw ownProblem('not-permitted', 'The plan is for the shops that work on the piece.');
  const { parties } = usePartyBook(commissionId);
  const { data: parts } = useSuspenseQuery(commissionQueries.parts(commissionId));
  const { data: legs } = useSuspenseQuery(commissionQueries.legs(commissionId));
  const today = todayIn();
  const choices = { commissionId, parties, parts, legs };
  const [own = ''] = mine;
  const isLead = mayDo(ability, 'create', 'Leg', { commissionId, partyId: own });
  const mayHandOver = mayDo(ability, 'create', 'Handoff', { commissionId, fromPartyId: own, toPartyId: '' });
  return (
    <TwoColumns
      main={
        <LegsSheet
          choices={choices}
          actsOf={(leg) => <LegActs commissionId={commissionId} leg={leg} today={today} />}
        />
      }
      side={
        <div className="grid gap-5">
          <WhoHasWhat
            commissionId={commissionId}
            {...(isLead
              ? {
                  actsOf: (part) => (
                    <Fold summary={<>Correct {part.name}</>}>
                      <div className="pb-4">
                        <EditPart commissionId={commissionId} parties={parties} part={part} />
                      </div>
                    </Fold>
                  ),
                }
              : {})}
          />
          <OpenHandoffs commissionId={commissionId} />
          {(isLead || mayHandOver) && (
            <Sheet title="Add to the plan">
              {isLead && (
                <>
                  <Fold strong summary="A part" open={parts.length === 0}>
                    <AddPart commissionId={commissionId} parties={parties} />
                  </Fold>
                  <Fold strong summary="A leg" open={parts.length > 0 && legs.length === 0}>
                    <AddLeg {...choices} />
                  </Fold>
                  <Fold strong summary="A joint">
                    <AddJoint {...choices} />
                  </Fold>
                </>
              )}
              {mayHandOver && (
                <Fold strong summary="A handoff">
                  <AddHandoff {...choices} mine={mine} />
                </Fold>
              )}
            </Sheet>
          )}
        </div>
      }
    />
  );
}
