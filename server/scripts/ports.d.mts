/**
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<boolean>}
 */
export function isFree(port: number, host?: string): Promise<boolean>;
/**
 * A free port below 32768: the kernel hands out those above to outgoing connections, which could take it in between.
 * @param {(port: number) => Promise<boolean>} [free]
 * @returns {Promise<number>}
 */
export function quietPort(free?: (port: number) => Promise<boolean>): Promise<number>;
/**
 * The port people open. One that was asked for is taken or refused; without a wish the first free one from `first` on.
 * @param {string | undefined} asked value of PORT
 * @param {(port: number) => Promise<boolean>} free
 * @param {number} [first]
 * @returns {Promise<number>}
 */
export function choosePort(
  asked: string | undefined,
  free: (port: number) => Promise<boolean>,
  first?: number,
): Promise<number>;
export const DEFAULT_APP_PORT: 4310;
