/** The least a follower needs to know of a message. */
export interface Sequenced {
  readonly sequence: number;
}

export interface ThreadFollowerOptions<M extends Sequenced> {
  /** Asks for messages after a sequence, ascending; may give them in several pages. */
  fetchAfter: (sequence: number) => Promise<readonly M[]>;
  /** Hands on new messages: each once, in order, without a gap. */
  onMessages: (messages: readonly M[]) => void;
  /** Sequence of the last message that is known already. */
  lastSequence: number;
  /** Told when asking failed; the next poke tries again. */
  onFailure?: (error: unknown) => void;
}

export interface ThreadFollower {
  /** Something may be new: an event came, or the connection is back. Many pokes at once make one more question. */
  poke: () => void;
  readonly lastSequence: number;
  stop: () => void;
}

/**
 * Follows one thread by sequence. Events only say "look": what is handed on is what the API gave, so a message lost or
 * doubled on the way of events is neither lost nor doubled here.
 */
export function createThreadFollower<M extends Sequenced>(options: ThreadFollowerOptions<M>): ThreadFollower {
  let last = options.lastSequence;
  let asking = false;
  let again = false;
  let stopped = false;

  const takeOver = (messages: readonly M[]): number => {
    const fresh: M[] = [];
    for (const message of messages) {
      if (message.sequence !== last + 1) continue; // seen already, or behind a gap that the next question fills
      fresh.push(message);
      last = message.sequence;
    }
    if (fresh.length > 0) options.onMessages(fresh);
    return fresh.length;
  };

  const ask = async (): Promise<void> => {
    asking = true;
    try {
      do {
        again = false;
        // A full page may have more behind it; an answer without anything new ends the round.
        while (!stopped && takeOver(stopped ? [] : await options.fetchAfter(last)) > 0);
      } while (again && !stopped);
    } catch (error) {
      options.onFailure?.(error);
    } finally {
      asking = false;
    }
  };

  return {
    poke() {
      if (stopped) return;
      if (asking) again = true;
      else void ask();
    },
    get lastSequence() {
      return last;
    },
    stop() {
      stopped = true;
    },
  };
}
