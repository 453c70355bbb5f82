import { startApplication, startBare } from '../support/processes.ts';
import type { Bench, Measurement } from '../support/bench.ts';
import { LONG_THREAD_MESSAGES, type Reader } from '../support/data.ts';
import { bodyOf, RunVoid, slice } from '../support/http-load.ts';
import { pairedRatio, verdictOf } from '../support/paired.ts';
import { rateWords, ratioWords, type Line } from '../support/report.ts';
import { listStatements, PAGE_ROWS, threadStatements } from '../support/statements.ts';
import type { BarePage } from '../bare/settings.ts';

const GOAL = { atLeast: 0.8 };
const CONNECTIONS = 8;

interface Case {
  readonly name: string;
  readonly what: string;
  readonly path: string;
  readonly reader: Reader;
  readonly page: BarePage;
}

async function casesOf(bench: Bench): Promise<Case[]> {
  const { bigReader, usualReader, longThread } = await bench.data();
  const list = async (name: string, what: string, reader: Reader): Promise<Case> => {
    const { page, before } = await listStatements(bench.db, reader);
    return {
      name,
      what,
      path: `/commissions?limit=${PAGE_ROWS}`,
      reader,
      page: { kind: 'list', statement: page, before, limit: PAGE_ROWS },
    };
  };
  const thread = await threadStatements(bench.db, bigReader, longThread);
  return [
    await list('usual-list', 'commission list, a shop in 40 commissions', usualReader),
    await list('big-list', 'commission list, a shop in 10,000', bigReader),
    {
      name: 'thread',
      what: 'thread page of 50 messages',
      path: `/commissions/${longThread.commissionId}/threads/${longThread.threadId}/messages?limit=${PAGE_ROWS}`,
      reader: bigReader,
      page: {
        kind: 'thread',
        statement: thread.page,
        before: thread.before,
        lastSequence: LONG_THREAD_MESSAGES,
      },
    },
  ];
}

/** List and thread pages over HTTP against Express and pg by themselves, with and without the statements of who asks. */
export const pages: Measurement = {
  title: 'Pages against a bare Express and pg handler with the same statement, rows and bytes',
  async run(bench) {
    const cases = await casesOf(bench);
    const application = await startApplication(bench.databaseUrl);
    const bare = await startBare('tests/bench/bare/pages.ts', {
      databaseUrl: bench.databaseUrl,
      pages: Object.fromEntries(cases.map((one) => [one.name, one.page])),
    }).catch(async (error: unknown) => {
      await application.stop();
      throw error;
    });
    try {
      const lines: Line[] = [];
      for (const { name, what, path, reader } of cases) {
        const headers = { cookie: reader.cookie };
        const body = await bodyOf(application.api + path, headers);
        for (const url of [`${bare.origin}/${name}`, `${bare.origin}/${name}-known`])
          if ((await bodyOf(url)) !== body) throw new RunVoid(`${url} does not answer the application's bytes`);
        const common = { connections: CONNECTIONS, seconds: bench.sliceSeconds, body };
        const ours = () => slice({ ...common, url: application.api + path, headers });
        const theirs = (url: string) => () => slice({ ...common, url });
        const ratio = await pairedRatio(ours, theirs(`${bare.origin}/${name}`), bench.rounds);
        lines.push({
          what,
          figure: ratioWords(ratio),
          detail: `${rateWords(ratio, 'answers/s')}, ${body.length} bytes`,
          goal: 'at least 0.80',
          verdict: verdictOf(ratio, GOAL),
        });
        const known = await pairedRatio(ours, theirs(`${bare.origin}/${name}-known`), bench.rounds);
        lines.push({
          what: `the same, bare handler asking who it is too`,
          figure: ratioWords(known),
          detail: rateWords(known, 'answers/s'),
        });
      }
      return lines;
    } finally {
      await application.stop();
      await bare.stop();
    }
  },
};
