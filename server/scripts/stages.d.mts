/**
 * @param {readonly string[]} wanted names of stages; none means all
 * @returns {readonly Stage[]}
 * @throws {Halt} on a name that there is not
 */
export function selectStages(wanted: readonly string[]): readonly Stage[];
/** In the order in which they are told. @type {readonly Stage[]} */
export const STAGES: readonly Stage[];
/**
 * name: what a person types; part: which of several checks of that name; args: for Node, from the root of the checkout
 */
export type Stage = {
  name: string;
  part: string;
  kind: 'check' | 'vitest' | 'playwright';
  args: readonly string[];
  limitMs: number;
  needsCluster?: true;
};
