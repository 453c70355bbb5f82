/**
 * Asks a child to end, and kills it after the grace.
 * @param {import('node:child_process').ChildProcess} child
 * @param {{ signal?: NodeJS.Signals, graceMs?: number, group?: boolean }} [how] group: the child leads a process group, all of which is to end
 */
export function endChild(
  child: import('node:child_process').ChildProcess,
  {
    signal,
    graceMs,
    group,
  }?: {
    signal?: NodeJS.Signals;
    graceMs?: number;
    group?: boolean;
  },
): Promise<void>;
/**
 * Runs a command of this folder: undoes all it started at its end, at Ctrl-C and at SIGTERM, then leaves.
 * @param {(scope: Scope) => Promise<number>} work answers the exit code
 * @param {{ signalCode?: number, onFailure?: () => void }} [options] signalCode: exit code when asked to stop
 */
export function runCommand(
  work: (scope: Scope) => Promise<number>,
  {
    signalCode,
    onFailure,
  }?: {
    signalCode?: number;
    onFailure?: () => void;
  },
): Promise<void>;
export function hasEnded(child: import('node:child_process').ChildProcess): boolean;
/** What a run has started, ended in reverse order when the run ends. */
export class Scope {
  /** @param {() => Promise<void>} undo */
  add(undo: () => Promise<void>): void;
  get closed(): boolean;
  close(): Promise<void>;
  /**
   * Runs a program to its end; it ends with the scope.
   * @param {string} command
   * @param {readonly string[]} args
   * @param {import('node:child_process').SpawnOptions} [options]
   * @returns {Promise<number>} exit code; 1 when it was ended by a signal or could not be run
   */
  run(command: string, args: readonly string[], options?: import('node:child_process').SpawnOptions): Promise<number>;
  #private;
}
