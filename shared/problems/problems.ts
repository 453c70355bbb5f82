import { z } from 'zod';

/** Every problem the API can answer with. The list is closed: a code that is not here does not compile. */
export const PROBLEMS = {
  'malformed-request': { status: 400, title: 'The request could not be read' },
  'idempotency-key-missing': { status: 400, title: 'This act needs an Idempotency-Key header' },
  'not-signed-in': { status: 401, title: 'Sign in first' },
  'credentials-refused': { status: 401, title: 'That sign-in was not accepted' },
  'not-permitted': { status: 403, title: 'Your role does not include this' },
  'origin-refused': { status: 403, title: 'This request did not come from Ferrule' },
  'not-found': { status: 404, title: 'There is nothing here for you' },
  'stale-revision': { status: 409, title: 'Someone saved this after you opened it' },
  'not-in-this-state': { status: 409, title: 'This cannot be done as things stand' },
  'already-there': { status: 409, title: 'That is already there' },
  'idempotency-in-progress': { status: 409, title: 'The same request is still being worked on' },
  'link-expired': { status: 410, title: 'This link has been used, withdrawn or has expired' },
  'too-large': { status: 413, title: 'That is larger than Ferrule takes' },
  'file-refused': { status: 422, title: 'This file was not taken' },
  'range-not-satisfiable': { status: 416, title: 'The file has no such range' },
  'input-invalid': { status: 422, title: 'Some values need attention' },
  'idempotency-key-reused': { status: 422, title: 'This key was used for another request' },
  'too-many-tries': { status: 429, title: 'Too many tries, wait a little' },
  unexpected: { status: 500, title: 'Something broke on our side' },
  'upstream-unavailable': { status: 502, title: 'Ferrule could not be reached' },
  busy: { status: 503, title: 'Ferrule is busy, try again in a moment' },
} as const satisfies Record<string, { status: number; title: string }>;

export type ProblemCode = keyof typeof PROBLEMS;

export const PROBLEM_CODES = Object.keys(PROBLEMS) as [ProblemCode, ...ProblemCode[]];

/** RFC 9457 problem type: a tag URI (RFC 4151), so that it names the problem without promising a page. */
export const problemType = (code: ProblemCode): string => `tag:ferrule.invalid,2026:problem/${code}`;

/** One value that needs attention; `pointer` is a JSON Pointer (RFC 6901) such as `/body/title`. */
export const problemErrorSchema = z.object({ pointer: z.string(), message: z.string() });
export type ProblemError = z.infer<typeof problemErrorSchema>;

/** Body of every refused request, media type `application/problem+json` (RFC 9457). */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string().optional(),
  instance: z.string(),
  code: z.enum(PROBLEM_CODES),
  errors: z.array(problemErrorSchema).optional(),
  /** With `stale-revision`: the record as it stands now, as its reader may see it. */
  current: z.unknown().optional(),
  /** With `too-many-tries` and `busy`: seconds to wait. */
  retry_after_s: z.int().optional(),
});
export type Problem = z.infer<typeof problemSchema>;
