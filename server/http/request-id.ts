import type { Request } from 'express';

/** The number of a request, made by the logger and told with every problem; pino types it wider than we make it. */
export const requestIdOf = (req: Request): string => (typeof req.id === 'string' ? req.id : 'none');
