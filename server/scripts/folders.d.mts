/**
 * Where data that must last is kept: outside the checkout and outside the temporary folder.
 * @param {{ checkout: string, env: Record<string, string | undefined>, uid: number, home: string, temporary: string, flavour?: 'dev' }} place
 * @returns {string}
 * @throws {Halt} when FERRULE_DATA_DIR points into the checkout or the temporary folder
 */
export function dataFolder({
  checkout,
  env,
  uid,
  home,
  temporary,
  flavour,
}: {
  checkout: string;
  env: Record<string, string | undefined>;
  uid: number;
  home: string;
  temporary: string;
  flavour?: 'dev';
}): string;
/**
 * Makes a folder that only its owner lists, and refuses one that belongs to somebody else or is a link: names in the
 * temporary folder can be foreseen by other users of the machine.
 * @param {string} folder
 * @param {number} uid
 */
export function prepareFolder(folder: string, uid: number): void;
/** The checkout that these scripts belong to. */
export const CHECKOUT: string;
export function checkoutHash(checkout: string): string;
export function throwAwayFolder({
  checkout,
  uid,
  base,
  name,
}: {
  checkout: string;
  uid: number;
  base: string;
  name: string;
}): string;
export function isInside(outer: string, inner: string): boolean;
