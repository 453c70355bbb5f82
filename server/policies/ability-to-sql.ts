import { rulesToAST } from '@casl/ability/extra';
import type { AppAbility } from '../../shared/abilities/ability.ts';
import type { Action } from '../../shared/abilities/actions.ts';
import type { SubjectName } from '../../shared/abilities/subjects.ts';

/** Columns that rules may speak of, per subject; anything else throws. */
const COLUMNS: { readonly [N in SubjectName]?: Readonly<Record<string, { column: string; array?: true }>> } = {
  Commission: { id: { column: 'id' }, memberKeys: { column: 'member_keys', array: true } },
  Party: { commissionId: { column: 'commission_id' } },
  Part: { commissionId: { column: 'commission_id' } },
  Leg: { commissionId: { column: 'commission_id' }, partyId: { column: 'party_id' } },
  Joint: {
    commissionId: { column: 'commission_id' },
    holePartyId: { column: 'hole_party_id' },
    shaftPartyId: { column: 'shaft_party_id' },
  },
  FitReport: {
    commissionId: { column: 'commission_id' },
    raisedByPartyId: { column: 'raised_by_party_id' },
    answerPartyId: { column: 'answer_party_id' },
  },
  Handoff: {
    commissionId: { column: 'commission_id' },
    fromPartyId: { column: 'from_party_id' },
    toPartyId: { column: 'to_party_id' },
  },
  Thread: {
    commissionId: { column: 'commission_id' },
    audience: { column: 'audience' },
    partyIds: { column: 'party_ids', array: true },
  },
};

/** What this needs to know of a node of CASL's syntax tree. */
interface AstNode {
  readonly operator: string;
  readonly value: unknown;
  readonly field?: string;
}

export interface SqlFragment {
  /** A boolean expression; `FALSE` when nothing is allowed. */
  sql: string;
  params: unknown[];
}

/**
 * The same rules as SQL, for lists: `WHERE <fragment>` returns a row exactly when the ability allows it. An operator or
 * field outside the allow-list throws, so that a rule this cannot express never widens a list.
 *
 * @param alias table alias in the statement
 * @param firstParam number of the fragment's first `$n`
 */
export function abilityToSql(
  ability: AppAbility,
  action: Action,
  name: SubjectName,
  alias: string,
  firstParam: number,
): SqlFragment {
  const columns = COLUMNS[name];
  if (!columns) throw new Error(`No columns are listed for ${name}`);
  const ast = rulesToAST(ability, action, name) as AstNode | null;
  if (!ast) return { sql: 'FALSE', params: [] };
  const params: unknown[] = [];
  const bind = (value: unknown): string => `$${firstParam + params.push(value) - 1}`;

  const write = (node: AstNode): string => {
    const value = node.value;
    if (node.operator === 'and' || node.operator === 'or') {
      const children = (value as AstNode[]).map(write);
      if (children.length === 0) return node.operator === 'and' ? 'TRUE' : 'FALSE';
      return `(${children.join(node.operator === 'and' ? ' AND ' : ' OR ')})`;
    }
    if (node.operator === 'not') return `NOT (${(value as AstNode[]).map(write).join(' AND ')})`;
    const target = node.field === undefined ? undefined : columns[node.field];
    if (!target) throw new Error(`${name} has no listed column for ${node.field ?? 'a rule without a field'}`);
    const column = `${alias}."${target.column}"`;
    if (node.operator === 'eq') return target.array ? `${bind(value)} = ANY(${column})` : `${column} = ${bind(value)}`;
    if (node.operator === 'in') return target.array ? `${column} && ${bind(value)}` : `${column} = ANY(${bind(value)})`;
    throw new Error(`Rules with ${node.operator} have no SQL yet`);
  };
  return { sql: write(ast), params };
}
