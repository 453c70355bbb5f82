import { mayDo, type AppAbility } from '../../shared/abilities/ability.ts';
import type { Action } from '../../shared/abilities/actions.ts';
import type { SubjectFacts, SubjectName } from '../../shared/abilities/subjects.ts';
import { NotFound, NotPermitted } from '../errors.ts';

/**
 * The one asserting helper: a record that may not even be seen is not found (404), one that is seen but not open to the
 * act is refused (403). Call it with the row just loaded.
 */
export function authorize<N extends SubjectName, F extends SubjectFacts[N]>(
  ability: AppAbility,
  action: Action,
  name: N,
  facts: F | null | undefined,
): asserts facts is F {
  if (!facts || !mayDo(ability, 'read', name, facts)) throw new NotFound();
  if (action !== 'read' && !mayDo(ability, action, name, facts)) throw new NotPermitted();
}

/** For acts that make something in a commission: 404 when the commission may not be seen, 403 when the act is not open. */
export function authorizeCreate<N extends SubjectName>(
  ability: AppAbility,
  name: N,
  facts: SubjectFacts[N] & { commissionId: string },
  action: Action = 'create',
): void {
  if (!mayDo(ability, 'read', 'Commission', { id: facts.commissionId, memberKeys: [] })) throw new NotFound();
  if (!mayDo(ability, action, name, facts)) throw new NotPermitted();
}

/** 404 unless the reader has a part in the commission: for lists, whose rows the ability filters. */
export function authorizeCommissionSight(ability: AppAbility, commissionId: string): void {
  if (!mayDo(ability, 'read', 'Commission', { id: commissionId, memberKeys: [] })) throw new NotFound();
}
