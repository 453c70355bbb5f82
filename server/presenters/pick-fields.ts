import { subject } from '@casl/ability';
import { permittedFieldsOf } from '@casl/ability/extra';
import type { AppAbility, AppSubject } from '../../shared/abilities/ability.ts';
import type { SubjectFacts, SubjectName } from '../../shared/abilities/subjects.ts';
import type { Action } from '../../shared/abilities/actions.ts';

/** Fields of one record that the ability opens to its reader for an act. */
export function fieldsFor<N extends SubjectName>(
  ability: AppAbility,
  action: Action,
  name: N,
  facts: SubjectFacts[N],
  allFields: readonly string[],
): Set<string> {
  const tagged = subject(name, { ...facts }) as unknown as AppSubject;
  return new Set(permittedFieldsOf(ability, action, tagged, { fieldsFrom: (rule) => rule.fields ?? [...allFields] }));
}

/** Leaves only the permitted keys; a contract's optional members are what this may take away. */
export const pickFields = <T extends object>(full: T, allowed: ReadonlySet<string>): T =>
  Object.fromEntries(Object.entries(full).filter(([key]) => allowed.has(key))) as T;
