/** SQL of a check that a text column holds one of a closed list of words. */
export const oneOf = (column: string, words: readonly string[]): string =>
  `"${column}" IN (${words.map((word) => `'${word.replaceAll("'", "''")}'`).join(', ')})`;
