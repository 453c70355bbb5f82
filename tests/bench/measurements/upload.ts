import { randomUUID } from 'node:crypto';
import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import type { Measurement } from '../support/bench.ts';
import { RunVoid } from '../support/http-load.ts';
import { pairedRatio, verdictOf } from '../support/paired.ts';
import { residentBytes, startApplication, startBare, type Running } from '../support/processes.ts';
import { ratioWords } from '../support/report.ts';

const FILE_BYTES = 20 * 1024 * 1024;
const GOAL = { atLeast: 0.85 };
const SAMPLE_MS = 20;
/** A kept connection may be closed by the server just as it is taken again. */
const ONE_EACH = { connection: 'close' };
/** More than this in one upload would mean that a file is held in memory and not streamed. */
const GROWTH_GOAL_MB = FILE_BYTES / 1e6;

const box = (type: string, body: Buffer): Buffer => {
  const head = Buffer.alloc(8);
  head.writeUInt32BE(body.length + 8);
  head.write(type, 4, 'latin1');
  return Buffer.concat([head, body]);
};

/** Boxes of an MP4 (ISO/IEC 14496-12, from memory) around 20 MB that do not repeat in any pattern worth packing. */
function videoLike(): Buffer<ArrayBuffer> {
  const samples = Buffer.alloc(FILE_BYTES);
  for (let at = 0, value = 1; at < samples.length; at += 4) {
    value = (Math.imul(value, 1_664_525) + 1_013_904_223) >>> 0;
    samples.writeUInt32LE(value, at);
  }
  const header = Buffer.alloc(100);
  header.writeUInt32BE(1000, 12); // time scale, ticks a second
  const parts = [
    box('ftyp', Buffer.from('isom\0\0\x02\0isomiso2mp41', 'latin1')),
    box('moov', box('mvhd', header)),
    box('mdat', samples),
  ];
  return Buffer.from(Buffer.concat(parts));
}

async function sent(request: Promise<Response>): Promise<number> {
  const from = performance.now();
  const response = await request.catch((error: unknown) => {
    throw new RunVoid('An upload broke off', { cause: error instanceof Error ? error.cause : error });
  });
  const words = await response.text();
  if (response.status !== 201) throw new RunVoid(`An upload was answered ${response.status}: ${words.slice(0, 300)}`);
  return FILE_BYTES / 1e6 / ((performance.now() - from) / 1000);
}

/** Runs work and says by how much the process grew meanwhile, bytes. */
async function growthOf(running: Running, work: () => Promise<unknown>): Promise<number> {
  const before = residentBytes(running.child);
  let most = before;
  const watch = setInterval(() => (most = Math.max(most, residentBytes(running.child))), SAMPLE_MS);
  try {
    await work();
  } finally {
    clearInterval(watch);
  }
  return most - before;
}

/** A 20 MB video as a browser sends it, against the same bytes piped to disk by node:http. */
export const upload: Measurement = {
  title: 'Upload of 20 MB against a bare pipe to disk',
  async run(bench) {
    const { bigReader, longThread } = await bench.data();
    const application = await startApplication(bench.databaseUrl);
    const bare = await startBare('tests/bench/bare/upload.ts', {}).catch(async (error: unknown) => {
      await application.stop();
      throw error;
    });
    try {
      const bytes = videoLike();
      const ours = async (): Promise<number> => {
        const form = new FormData();
        const fields = { id: randomUUID(), place: 'thread', placeId: longThread.threadId, purpose: 'message' };
        for (const [name, value] of Object.entries(fields)) form.append(name, value);
        form.append('file', new Blob([bytes], { type: 'video/mp4' }), 'turning.mp4');
        const rate = await sent(
          fetch(`${application.api}/commissions/${longThread.commissionId}/files`, {
            method: 'POST',
            headers: { cookie: bigReader.cookie, origin: application.origin, 'x-ferrule': '1', ...ONE_EACH },
            body: form,
          }),
        );
        await rm(join(application.folder, 'uploads', 'objects'), { recursive: true, force: true });
        return rate;
      };
      const theirs = (): Promise<number> =>
        sent(fetch(bare.origin, { method: 'POST', headers: ONE_EACH, body: bytes }));
      await ours();
      const growthMb = (await growthOf(application, async () => Promise.all([ours(), ours(), ours()]))) / 1e6;
      const ratio = await pairedRatio(ours, theirs, bench.rounds);
      return [
        {
          what: 'one upload at a time',
          figure: ratioWords(ratio),
          detail: `${ratio.ours.toFixed(0)} against ${ratio.theirs.toFixed(0)} MB/s, ${ratio.rounds} pairs`,
          goal: 'at least 0.85',
          verdict: verdictOf(ratio, GOAL),
        },
        {
          what: 'growth of resident memory while three are received at once',
          figure: `${growthMb.toFixed(0)} MB`,
          goal: `at most ${GROWTH_GOAL_MB.toFixed(0)} MB, one file of the three`,
          verdict: verdictOf({ median: growthMb, min: growthMb, max: growthMb }, { atMost: GROWTH_GOAL_MB }),
        },
      ];
    } finally {
      await application.stop();
      await bare.stop();
    }
  },
};
