/**
 * The secrets of one data folder: made at random the first time, then read again. Readable by their owner alone.
 * @param {string} folder
 * @returns {Secrets}
 */
export function loadSecrets(folder: string): Secrets;
export type Secrets = {
  sessionSecret: string;
  fieldKey: string;
  adminPassword: string;
  appPassword: string;
};
