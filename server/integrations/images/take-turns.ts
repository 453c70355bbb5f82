import { AppError } from '../../errors.ts';

/**
 * Lets so many pieces of work run at once and the next ones wait in order.
 * @param atOnce pieces that run together
 * @param waitingMax pieces that may wait; one more is refused with `busy` rather than queued without end
 */
export function takeTurns(atOnce: number, waitingMax: number): <T>(work: () => Promise<T>) => Promise<T> {
  const waiting: (() => void)[] = [];
  let running = 0;
  return async (work) => {
    if (running < atOnce) running += 1;
    else {
      if (waiting.length >= waitingMax)
        throw new AppError(
          'busy',
          'Many photographs are being worked on just now. Nothing was kept; send it again in a moment.',
          {
            retryAfterS: 5,
          },
        );
      // The one who finishes hands its place on, so that nobody who comes later slips in between.
      await new Promise<void>((resolve) => waiting.push(resolve));
    }
    try {
      return await work();
    } finally {
      const next = waiting.shift();
      if (next) next();
      else running -= 1;
    }
  };
}
