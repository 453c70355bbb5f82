/** The `pg` package is asked for late: these scripts run before the packages are installed. */
const loadPg = async () => (await import('pg')).default;

/**
 * @template T
 * @param {string} url
 * @param {(client: import('pg').Client) => Promise<T>} work
 * @returns {Promise<T>}
 */
async function withClient(url, work) {
  const pg = await loadPg();
  const client = new pg.Client({ connectionString: url, connectionTimeoutMillis: 10_000 });
  // A server that goes away between two statements shows in the next one.
  client.on('error', () => undefined);
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

/**
 * The application's database and its role, which owns that database and nothing else.
 * @param {string} adminUrl
 * @param {string} password hexadecimal digits
 * @returns {Promise<string>} address for the application
 */
export function ensureAppDatabase(adminUrl, password) {
  return withClient(adminUrl, async (client) => {
    const there = await client.query(
      "SELECT EXISTS (SELECT FROM pg_roles WHERE rolname = 'ferrule') AS role, EXISTS (SELECT FROM pg_database WHERE datname = 'ferrule') AS database",
    );
    const [{ role, database }] = there.rows;
    await client.query(`${role ? 'ALTER' : 'CREATE'} ROLE ferrule LOGIN PASSWORD '${password}'`);
    if (!database) await client.query('CREATE DATABASE ferrule OWNER ferrule');
    await client.query('REVOKE CONNECT ON DATABASE ferrule FROM PUBLIC');
    const url = new URL(adminUrl);
    Object.assign(url, { username: 'ferrule', password, pathname: '/ferrule' });
    return url.href;
  });
}

/**
 * Marks a cluster as one whose databases may be thrown away; what drops databases looks for the mark first.
 * @param {string} adminUrl
 */
export function markThrowAway(adminUrl) {
  return withClient(adminUrl, async (client) => {
    await client.query('CREATE TABLE IF NOT EXISTS ferrule_throw_away (data_directory text PRIMARY KEY)');
    await client.query(
      "INSERT INTO ferrule_throw_away VALUES (current_setting('data_directory')) ON CONFLICT DO NOTHING",
    );
  });
}

/**
 * @param {string} adminUrl
 * @param {string} name lower-case letters, digits and underscores
 * @returns {Promise<string>} address of the new, empty database
 */
export function createEmptyDatabase(adminUrl, name) {
  return withClient(adminUrl, async (client) => {
    await client.query(`CREATE DATABASE ${name} TEMPLATE template0`);
    const url = new URL(adminUrl);
    url.pathname = `/${name}`;
    return url.href;
  });
}
