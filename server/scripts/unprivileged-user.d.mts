/** @typedef {{ name: string, uid: number, gid: number }} SystemUser */
/**
 * @param {string} passwd text of /etc/passwd
 * @returns {SystemUser | null} postgres if there is one, else nobody
 */
export function pickUser(passwd: string): SystemUser | null;
/**
 * The user that the database runs as: null means "as we are". PostgreSQL refuses to run as root.
 * @returns {SystemUser | null}
 */
export function databaseUser(): SystemUser | null;
export function canEnter(user: SystemUser | null, folder: string): boolean;
export type SystemUser = {
  name: string;
  uid: number;
  gid: number;
};
