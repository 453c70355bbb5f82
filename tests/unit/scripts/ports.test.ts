import { createServer, type AddressInfo } from 'node:net';
import { describe, expect, it } from 'vitest';
import { choosePort, isFree, quietPort } from '../../../server/scripts/ports.mjs';

const freeBut =
  (...taken: number[]) =>
  (port: number): Promise<boolean> =>
    Promise.resolve(!taken.includes(port));

describe('port of the application', () => {
  it('is the usual one, or the next free one', async () => {
    expect(await choosePort(undefined, freeBut())).toBe(4310);
    expect(await choosePort('', freeBut(4310, 4311))).toBe(4312);
  });

  it('is the one that was asked for or none', async () => {
    expect(await choosePort('8080', freeBut(4310))).toBe(8080);
    await expect(choosePort('8080', freeBut(8080))).rejects.toThrow('Port 8080 is in use');
  });

  it.each(['abc', '0', '70000', '80.5', '-1', ' 80'])('refuses %j', async (asked) => {
    await expect(choosePort(asked, freeBut())).rejects.toThrow('is not a port');
  });

  it('says so when none is free', async () => {
    await expect(choosePort(undefined, () => Promise.resolve(false))).rejects.toThrow('No port from 4310 to 4409');
  });
});

describe('port of the database', () => {
  it('lies below those handed out to outgoing connections', async () => {
    for (let i = 0; i < 50; i += 1) {
      const port = await quietPort(freeBut());
      expect(port).toBeGreaterThanOrEqual(20_000);
      expect(port).toBeLessThan(32_000);
    }
  });
});

it('sees a port that is really taken', async () => {
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  expect(await isFree(port)).toBe(false);
  await new Promise((resolve) => server.close(resolve));
  expect(await isFree(port)).toBe(true);
});
