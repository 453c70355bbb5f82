import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, realpath, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { parsePostmaster } from '../../../server/scripts/cluster-leftovers.mjs';
import { inTurn, noteOf, takeExclusive } from '../../../server/scripts/exclusive.mjs';
import { endLeftBehind, processesIn, startTicks } from '../../../server/scripts/process-table.mjs';

describe('locks', () => {
  const name = `test/${process.pid}`;

  it('are held by one, tell where, and are free again', async () => {
    const first = await takeExclusive(name);
    first?.setNote('at http://127.0.0.1:4310');
    expect(await takeExclusive(name)).toBeNull();
    expect(await noteOf(name)).toBe('at http://127.0.0.1:4310');
    await first?.release();
    const second = await takeExclusive(name);
    expect(second).not.toBeNull();
    await second?.release();
  });

  it('are freed by the death of their holder', async () => {
    const script = new URL('../../../server/scripts/exclusive.mjs', import.meta.url).href;
    const code = `import { takeExclusive } from ${JSON.stringify(script)}; await takeExclusive(${JSON.stringify(`${name}/killed`)}); console.log('held'); setInterval(() => {}, 1000);`;
    const holder = spawn(process.execPath, ['--input-type=module', '-e', code], {
      stdio: ['ignore', 'pipe', 'inherit'],
    });
    await once(holder.stdout, 'data');
    expect(await takeExclusive(`${name}/killed`)).toBeNull();
    holder.kill('SIGKILL');
    await once(holder, 'exit');
    const lock = await takeExclusive(`${name}/killed`);
    expect(lock).not.toBeNull();
    await lock?.release();
  });

  it('let work happen one after the other', async () => {
    const order: string[] = [];
    const work = (who: string) => async (): Promise<void> => {
      order.push(`${who} in`);
      await new Promise((resolve) => setTimeout(resolve, 20));
      order.push(`${who} out`);
    };
    await Promise.all([inTurn(`${name}/turn`, work('a')), inTurn(`${name}/turn`, work('b'))]);
    expect(order).toEqual([order[0], order[0]?.replace('in', 'out'), order[2], order[2]?.replace('in', 'out')]);
    expect(order).toHaveLength(4);
  });
});

describe('processes left behind', () => {
  it('are found by their folder, let be when they are strangers, and ended even if they do not listen', async () => {
    const folder = await realpath(await mkdtemp(join(tmpdir(), 'ferrule-left-')));
    const child = spawn(
      process.execPath,
      ['-e', "process.on('SIGTERM', () => {}); console.log('up'); setInterval(() => {}, 1000);"],
      { cwd: folder, stdio: ['ignore', 'pipe', 'ignore'] },
    );
    await once(child.stdout, 'data');
    const pid = child.pid ?? 0;
    expect(processesIn(folder)).toEqual([pid]);
    const ticks = startTicks(pid) ?? '';
    await endLeftBehind(pid, `${ticks}0`, 100);
    expect(processesIn(folder)).toEqual([pid]);
    const ended = once(child, 'exit');
    await endLeftBehind(pid, ticks, 100);
    await ended;
    expect(processesIn(folder)).toEqual([]);
    expect(startTicks(pid)).toBeNull();
    await rm(folder, { recursive: true });
  });
});

// Layout from memory of PostgreSQL's pidfile.h: process, data folder, start, port, socket folder, address, memory key, status.
it('reads what PostgreSQL wrote about its server', () => {
  const text = '3581\n/data/postgres\n1796127050\n24877\n\n127.0.0.1\n  5374      12\nready   \n';
  expect(parsePostmaster(text)).toEqual({ pid: 3581, port: 24877, ready: true });
  expect(parsePostmaster(text.replace('ready   ', 'starting')).ready).toBe(false);
  expect(parsePostmaster('3581\n/data\n').ready).toBe(false);
});
