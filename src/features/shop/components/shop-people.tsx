import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import {
  changeShopMember,
  removeShopMember,
  withdrawShopInvitation,
  type ShopMemberView,
} from '../../../../shared/contracts/shops.ts';
import { SHOP_ROLES, type ShopRole } from '../../../../shared/contracts/vocabulary.ts';
import { AskFirst } from '../../../components/ask-first.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { keys } from '../../../lib/query-keys.ts';
import { meQuery } from '../../../lib/queries/me.ts';
import { shopQueries } from '../../../lib/queries/shops.ts';
import { SHOP_ROLE_WORDS } from '../../../lib/words.ts';

/** A choice of role that counts once it is saved: going through a list by keyboard must not change anyone's rights. */
function MemberRole({ shopId, member }: { shopId: string; member: ShopMemberView }) {
  const [role, setRole] = useState<ShopRole>(member.role);
  const change = useAct(changeShopMember, {
    said: 'The role is changed.',
    stale: () => [keys.shops.members(shopId), keys.me()],
  });
  return (
    <form
      className="grid gap-2"
      onSubmit={(event) => {
        event.preventDefault();
        change.run({ params: { shopId, accountId: member.accountId }, body: { role } });
      }}
    >
      <span className="flex flex-wrap items-center gap-2">
        <Select
          aria-label={`What ${member.displayName} does`}
          value={role}
          onChange={(event) => setRole(event.target.value as ShopRole)}
        >
          {SHOP_ROLES.map((one) => (
            <option key={one} value={one}>
              {SHOP_ROLE_WORDS[one]}
            </option>
          ))}
        </Select>
        {role !== member.role && (
          <Button type="submit" variant="outline" busy={change.pending}>
            Make {member.displayName} {SHOP_ROLE_WORDS[role].toLowerCase()}
          </Button>
        )}
      </span>
      <ProblemNotice problem={change.problem} />
    </form>
  );
}

function LeaveShop({ shopId, shopName, accountId }: { shopId: string; shopName: string; accountId: string }) {
  const navigate = useNavigate();
  const leave = useAct(removeShopMember, {
    said: 'You have left the shop.',
    stale: () => [keys.me(), keys.bench(), keys.commissions.lists()],
    onDone: () => void navigate('/', { replace: true }),
  });
  return (
    <AskFirst
      label="Leave the shop"
      title={`Leave ${shopName}`}
      description="You lose sight of its commissions at once. What you wrote and did stays with the shop."
      act="Leave the shop"
      keep="Stay"
      pending={leave.pending}
      problem={leave.problem}
      onAct={() => leave.run({ params: { shopId, accountId } })}
    />
  );
}

function TakeOut({ shopId, member }: { shopId: string; member: ShopMemberView }) {
  const remove = useAct(removeShopMember, { said: 'They are taken out.', stale: () => [keys.shops.members(shopId)] });
  return (
    <AskFirst
      label="Take out"
      title={`Take ${member.displayName} out of the shop`}
      description="They lose sight of its commissions at once. What they wrote and did stays."
      act={`Take ${member.displayName} out`}
      keep="Keep them"
      pending={remove.pending}
      problem={remove.problem}
      onAct={() => remove.run({ params: { shopId, accountId: member.accountId } })}
    />
  );
}

/** A shop's people and who is invited; its owners change both, and everyone may leave. */
export function ShopPeople({ shopId, shopName, isOwner }: { shopId: string; shopName: string; isOwner: boolean }) {
  const { data } = useSuspenseQuery(shopQueries.members(shopId));
  const { data: me } = useSuspenseQuery(meQuery());
  const withdraw = useAct(withdrawShopInvitation, {
    said: 'The invitation is taken back.',
    stale: () => [keys.shops.members(shopId)],
  });
  return (
    <Sheet title="People">
      <ul>
        {data.members.map((member) => (
          <li
            key={member.accountId}
            className="flex flex-wrap items-center justify-between gap-3 border-b border-hairline py-3"
          >
            <span>
              <span className="font-semibold">{member.displayName}</span>{' '}
              <span className="text-note text-lead-grey">{member.email}</span>
            </span>
            <span className="flex flex-wrap items-start gap-2">
              {isOwner ? (
                <MemberRole key={member.role} shopId={shopId} member={member} />
              ) : (
                <span>{SHOP_ROLE_WORDS[member.role]}</span>
              )}
              {member.accountId === me.id ? (
                <LeaveShop shopId={shopId} shopName={shopName} accountId={me.id} />
              ) : (
                isOwner && <TakeOut shopId={shopId} member={member} />
              )}
            </span>
          </li>
        ))}
        {data.invitations.map((invitation) => (
          <li
            key={invitation.id}
            className="flex flex-wrap items-center justify-between gap-3 border-b border-hairline py-3"
          >
            <span>
              {invitation.email}{' '}
              <span className="text-note text-lead-grey">
                invited as {SHOP_ROLE_WORDS[invitation.role].toLowerCase()}
              </span>
            </span>
            <Button variant="quiet" onClick={() => withdraw.run({ params: { shopId, invitationId: invitation.id } })}>
              Take it back
            </Button>
          </li>
        ))}
      </ul>
      <ProblemNotice problem={withdraw.problem} />
    </Sheet>
  );
}
