import fc from 'fast-check';
import { expect, it } from 'vitest';
import { createThreadFollower } from '../../../shared/realtime/thread-follower.ts';

const settle = async (): Promise<void> => {
  for (let turn = 0; turn < 40; turn += 1) await Promise.resolve();
};

it('hands on every message once and in order, whatever is poked, lost, doubled or refused', async () => {
  const steps = fc.array(
    fc.record({
      arrive: fc.nat(3),
      pokes: fc.nat(3),
      fails: fc.boolean(),
      pageSize: fc.integer({ min: 1, max: 3 }),
      overlap: fc.nat(2),
    }),
    { maxLength: 12 },
  );
  await fc.assert(
    fc.asyncProperty(steps, async (script) => {
      let stored = 0;
      let step = script[0];
      const seen: number[] = [];
      const follower = createThreadFollower<{ sequence: number }>({
        lastSequence: 0,
        fetchAfter: async (after) => {
          await Promise.resolve();
          if (step?.fails) throw new Error('cut');
          // A server may give what is known already, and no more than a page.
          const from = Math.max(1, after + 1 - (step?.overlap ?? 0));
          return Array.from(
            { length: Math.max(0, Math.min(stored, after + (step?.pageSize ?? 3)) - from + 1) },
            (_one, index) => ({ sequence: from + index }),
          );
        },
        onMessages: (messages) => seen.push(...messages.map((message) => message.sequence)),
      });
      for (step of script) {
        stored += step.arrive;
        for (let poke = 0; poke < step.pokes; poke += 1) follower.poke();
        await settle();
      }
      step = undefined;
      follower.poke();
      await settle();
      expect(seen).toEqual(Array.from({ length: stored }, (_one, index) => index + 1));
      expect(follower.lastSequence).toBe(stored);
    }),
  );
});

it('says nothing more once it is stopped', async () => {
  const seen: number[] = [];
  const follower = createThreadFollower<{ sequence: number }>({
    lastSequence: 0,
    fetchAfter: () => Promise.resolve([{ sequence: 1 }]),
    onMessages: (messages) => seen.push(messages.length),
  });
  follower.stop();
  follower.poke();
  await settle();
  expect(seen).toEqual([]);
});
