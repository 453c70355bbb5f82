import { describe, expect, it } from 'vitest';
import { dropTestDatabase, isTestDatabaseName } from '../../support/test-database.ts';

describe('names of databases that may be dropped', () => {
  it.each([
    ['ferrule_api_test_123_4', true],
    ['ferrule', false],
    ['postgres', false],
    ['ferrule_api_test_123', false],
    ['ferrule_api_test_123_4_copy', false],
    ['xferrule_api_test_123_4', false],
    ['ferrule_api_test_123_4\n', false],
  ])('%j', (name, expected) => {
    expect(isTestDatabaseName(name)).toBe(expected);
  });

  it('refuses before it connects: another name, another server', async () => {
    const admin = 'postgres://admin:x@127.0.0.1:1/postgres';
    await expect(dropTestDatabase(admin, 'postgres://admin:x@127.0.0.1:1/ferrule')).rejects.toThrow(
      'not a test database',
    );
    await expect(dropTestDatabase(admin, 'postgres://admin:x@127.0.0.1:2/ferrule_api_test_1_1')).rejects.toThrow(
      'another server',
    );
  });
});
