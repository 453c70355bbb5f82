import { randomUUID } from 'node:crypto';
import type { Request } from 'autocannon';
import type { Bench, Measurement } from '../support/bench.ts';
import type { Data } from '../support/data.ts';
import { RunVoid, slice } from '../support/http-load.ts';
import { pairedRatio, verdictOf } from '../support/paired.ts';
import { startApplication, startBare } from '../support/processes.ts';
import { rateWords, ratioWords } from '../support/report.ts';

const GOAL = { atLeast: 0.5 };
const CONNECTIONS = 16;
const BODY = 'The collar sits now; the pommel thread wants one more light pass before it goes on its way.';

/** A new message each time, by writer and thread in turn. */
function postsOf(
  { writers, posts }: Data,
  pathOf: (place: Data['posts'][number]) => string,
  origin: string,
): Request[] {
  let turn = 0;
  return [
    {
      method: 'POST',
      setupRequest: (request) => {
        turn += 1;
        const writer = writers[turn % writers.length];
        const place = posts[turn % posts.length];
        if (!writer || !place) throw new Error('There is nobody to write, or nowhere');
        return {
          ...request,
          path: pathOf(place),
          headers: {
            'content-type': 'application/json',
            cookie: writer.cookie,
            origin,
            'x-account': writer.accountId,
          },
          body: JSON.stringify({ id: randomUUID(), body: BODY, mentionedAccountIds: [], fileIds: [] }),
        };
      },
    },
  ];
}

const countOf = async (bench: Bench, table: string): Promise<number> => {
  const { rows } = await bench.client.query<{ count: number }>(`SELECT count(*)::int AS count FROM "${table}"`);
  return rows[0]?.count ?? 0;
};

/** A gap-free sequence in every thread that was written to. */
async function assertSequences(bench: Bench, threadIds: readonly string[]): Promise<void> {
  const { rows } = await bench.client.query<{ id: string }>(
    `SELECT t."id" FROM "thread" t WHERE t."id" = ANY($1) AND (t."last_sequence", t."last_sequence") IS DISTINCT FROM
       (SELECT (count(*)::int, max(m."sequence")) FROM "message" m WHERE m."thread_id" = t."id")`,
    [threadIds],
  );
  if (rows.length > 0) throw new RunVoid(`${rows.length} threads have a gap in their sequence`);
}

/** A message over HTTP: who asks, rights, client id, sequence and outbox row, against one bare INSERT over HTTP. */
export const post: Measurement = {
  title: 'Posted message against one bare INSERT',
  async run(bench) {
    const data = await bench.data();
    const application = await startApplication(bench.databaseUrl);
    const bare = await startBare('tests/bench/bare/post.ts', { databaseUrl: bench.databaseUrl }).catch(
      async (error: unknown) => {
        await application.stop();
        throw error;
      },
    );
    try {
      const before = await countOf(bench, 'message');
      const common = { connections: CONNECTIONS, seconds: bench.sliceSeconds };
      const [ours, theirs] = [
        postsOf(
          data,
          ({ commissionId, threadId }) => `/api/v1/commissions/${commissionId}/threads/${threadId}/messages`,
          application.origin,
        ),
        postsOf(data, ({ threadId }) => `/threads/${threadId}/messages`, bare.origin),
      ];
      const ratio = await pairedRatio(
        () => slice({ ...common, url: application.origin, requests: ours }),
        () => slice({ ...common, url: bare.origin, requests: theirs }),
        bench.rounds,
      );
      const stored = (await countOf(bench, 'message')) - before;
      await assertSequences(
        bench,
        data.posts.map((place) => place.threadId),
      );
      return [
        {
          what: `message posted by 16 writers into ${data.posts.length} threads`,
          figure: ratioWords(ratio),
          detail: `${rateWords(ratio, 'messages/s')}, ${stored} stored without a gap, ${CONNECTIONS} connections`,
          goal: 'at least 0.50',
          verdict: verdictOf(ratio, GOAL),
        },
      ];
    } finally {
      await application.stop();
      await bare.stop();
    }
  },
};
