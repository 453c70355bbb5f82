import type { z } from 'zod';
import type { ProblemError } from './problems.ts';

const escapeSegment = (segment: PropertyKey): string => String(segment).replaceAll('~', '~0').replaceAll('/', '~1');

/** Zod issues as JSON Pointers (RFC 6901) below `/body`, `/query` or `/params`. */
export const pointersOf = (place: 'body' | 'query', issues: readonly z.core.$ZodIssue[]): ProblemError[] =>
  issues.map((issue) => ({
    pointer: ['', place, ...issue.path.map(escapeSegment)].join('/'),
    message: issue.message,
  }));
