/**
 * The application's database and its role, which owns that database and nothing else.
 * @param {string} adminUrl
 * @param {string} password hexadecimal digits
 * @returns {Promise<string>} address for the application
 */
export function ensureAppDatabase(adminUrl: string, password: string): Promise<string>;
/**
 * Marks a cluster as one whose databases may be thrown away; what drops databases looks for the mark first.
 * @param {string} adminUrl
 */
export function markThrowAway(adminUrl: string): Promise<void>;
/**
 * @param {string} adminUrl
 * @param {string} name lower-case letters, digits and underscores
 * @returns {Promise<string>} address of the new, empty database
 */
export function createEmptyDatabase(adminUrl: string, name: string): Promise<string>;
