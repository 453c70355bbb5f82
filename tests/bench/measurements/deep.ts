import { encodeCursor } from '../../../server/queries/keyset.ts';
import type { Bench, Measurement } from '../support/bench.ts';
import { COMMISSIONS } from '../support/data.ts';
import { bodyOf, RunVoid, slice } from '../support/http-load.ts';
import { pairedRatio, verdictOf } from '../support/paired.ts';
import { startApplication } from '../support/processes.ts';
import { rateWords, ratioWords, type Line } from '../support/report.ts';
import { PAGE_ROWS } from '../support/statements.ts';

const GOAL = { atMost: 1.3 };
const CONNECTIONS = 8;

/** The page mark before the last full page of the list. */
async function lastPageMark(bench: Bench): Promise<string> {
  const { rows } = await bench.client.query<{ mark: string; id: string }>(
    'SELECT "updated_at"::text AS mark, "id" FROM "commission" ORDER BY "updated_at" DESC, "id" DESC OFFSET $1 LIMIT 1',
    [COMMISSIONS - PAGE_ROWS - 1],
  );
  const [row] = rows;
  if (!row) throw new Error('The last page of the list was not found');
  return encodeCursor([row.mark, row.id]);
}

const rowsOf = (body: string): number => {
  const parsed = JSON.parse(body) as { items?: unknown[]; messages?: unknown[] };
  return (parsed.items ?? parsed.messages ?? []).length;
};

/** The time of the deepest page over that of the first, through the whole application. */
export const deep: Measurement = {
  title: 'Deepest page against the first',
  async run(bench) {
    const { bigReader, longThread } = await bench.data();
    const headers = { cookie: bigReader.cookie };
    const list = `/commissions?limit=${PAGE_ROWS}`;
    const thread = `/commissions/${longThread.commissionId}/threads/${longThread.threadId}/messages?limit=${PAGE_ROWS}`;
    const cases = [
      { what: 'commission list, last of 10,000', first: list, last: `${list}&cursor=${await lastPageMark(bench)}` },
      { what: 'thread, first of 100,000 messages', first: thread, last: `${thread}&before=${PAGE_ROWS + 1}` },
    ];
    const application = await startApplication(bench.databaseUrl);
    try {
      const lines: Line[] = [];
      for (const { what, first, last } of cases) {
        const rate = async (path: string): Promise<() => Promise<number>> => {
          const url = application.api + path;
          const body = await bodyOf(url, headers);
          if (rowsOf(body) !== PAGE_ROWS) throw new RunVoid(`${path} has ${rowsOf(body)} rows and not ${PAGE_ROWS}`);
          return () => slice({ url, headers, body, connections: CONNECTIONS, seconds: bench.sliceSeconds });
        };
        // Rate of the first page over the last one's is the last one's time over the first one's.
        const ratio = await pairedRatio(await rate(first), await rate(last), bench.rounds);
        lines.push({
          what,
          figure: ratioWords(ratio),
          detail: `first page ${rateWords(ratio, 'answers/s')}`,
          goal: 'time at most 1.30 of the first page',
          verdict: verdictOf(ratio, GOAL),
        });
      }
      return lines;
    } finally {
      await application.stop();
    }
  },
};
