import { QueryFailedError } from 'typeorm';
import {
  PROBLEMS,
  problemType,
  type Problem,
  type ProblemCode,
  type ProblemError,
} from '../shared/problems/problems.ts';

interface ProblemParts {
  detail?: string;
  errors?: ProblemError[];
  current?: unknown;
  retryAfterS?: number;
}

/** An answer other than the one asked for; `detail` says what happened, what was kept and what to do. */
export class AppError extends Error {
  readonly code: ProblemCode;
  readonly parts: ProblemParts;

  constructor(code: ProblemCode, detail?: string, parts: ProblemParts = {}) {
    super(detail ?? PROBLEMS[code].title);
    this.code = code;
    this.parts = detail === undefined ? parts : { ...parts, detail };
  }
}

export class NotFound extends AppError {
  constructor() {
    super('not-found');
  }
}

export class NotPermitted extends AppError {
  constructor(detail?: string) {
    super('not-permitted', detail);
  }
}

export class NotInThisState extends AppError {
  constructor(detail: string) {
    super('not-in-this-state', detail);
  }
}

/** One or more values that need attention; the pointer starts at `/body`, `/query` or `/params`. */
export class InputInvalid extends AppError {
  constructor(errors: ProblemError[]) {
    super('input-invalid', undefined, { errors });
  }
}

/** Someone saved since the caller read the record; carries the record as the caller may see it now. */
export class StaleRevision extends AppError {
  constructor(current: unknown) {
    super('stale-revision', 'Nothing of yours was saved or lost. Compare both and save again.', { current });
  }
}

/** Which problem a broken constraint means, by the constraint's name. */
const CONSTRAINT_PROBLEMS: Record<string, [ProblemCode, string]> = {
  account_email_key: ['already-there', 'There is an account with this e-mail address.'],
  fit_report_open_on_joint_key: ['already-there', 'This joint has an open report. Add to that one.'],
  handoff_offer_one_standing_key: [
    'not-in-this-state',
    'Another offer was made a moment before. Look at it and answer.',
  ],
  party_commission_shop_key: ['already-there', 'This shop takes part already.'],
  party_commission_account_key: ['already-there', 'This person takes part already.'],
  message_author_client_id_key: ['already-there', 'A message with this id is in another thread.'],
};

const constraintOf = (thrown: { driverError: unknown }): string | undefined =>
  (thrown.driverError as { constraint?: string }).constraint;

/** True when a statement broke this constraint. */
export const isConstraint = (thrown: unknown, name: string): boolean =>
  thrown instanceof QueryFailedError && constraintOf(thrown) === name;

/** Codes of pg and of the network that mean "not now": the database is restarting or cannot be reached. */
const OUTAGE = new Set(['57P01', '57P03', '08006', '08001', 'ECONNREFUSED', 'ECONNRESET', '53300']);

/** Two transactions were in each other's way and this one gave way: nothing of it is left, and it can be tried again. */
const GAVE_WAY = new Set(['40P01', '40001']);

function asAppError(thrown: unknown): AppError {
  if (thrown instanceof AppError) return thrown;
  if (thrown instanceof QueryFailedError) {
    const known = CONSTRAINT_PROBLEMS[constraintOf(thrown) ?? ''];
    if (known) return new AppError(...known);
  }
  const code = (thrown as { code?: unknown } | null)?.code;
  if (typeof code === 'string' && OUTAGE.has(code))
    return new AppError(
      'busy',
      'Ferrule cannot reach its database just now. Nothing was saved; try again in a moment.',
      { retryAfterS: 2 },
    );
  if (typeof code === 'string' && GAVE_WAY.has(code))
    return new AppError('busy', 'Someone else was at the same thing. Nothing was saved; try again.', {
      retryAfterS: 1,
    });
  const status = (thrown as { status?: unknown } | null)?.status;
  if (status === 413) return new AppError('too-large');
  if (status === 404) return new AppError('not-found');
  if (status === 415)
    return new AppError('malformed-request', 'The body is in an encoding that is not read here; send UTF-8.');
  if (status === 400)
    return new AppError('malformed-request', 'The body is not the JSON it says it is, or the address cannot be read.');
  return new AppError(
    'unexpected',
    'Nothing was saved. Try again; if it happens again, tell your steward the request number.',
  );
}

/** The only translator from anything thrown to an RFC 9457 body. Messages of unknown errors stay in the log. */
export function toProblem(thrown: unknown, requestId: string): Problem {
  const { code, parts } = asAppError(thrown);
  const { status, title } = PROBLEMS[code];
  return {
    type: problemType(code),
    title,
    status,
    instance: `urn:request:${requestId}`,
    code,
    ...(parts.detail === undefined ? {} : { detail: parts.detail }),
    ...(parts.errors === undefined ? {} : { errors: parts.errors }),
    ...(parts.current === undefined ? {} : { current: parts.current }),
    ...(parts.retryAfterS === undefined ? {} : { retry_after_s: parts.retryAfterS }),
  };
}
