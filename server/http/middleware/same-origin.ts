import type { RequestHandler } from 'express';
import { AppError } from '../../errors.ts';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/** True when a request that changes things comes from the product's own pages. */
export function comesFromOwnOrigin(
  headers: { origin?: string | undefined; fetchSite?: string | undefined },
  ownOrigin: string,
): boolean {
  if (headers.origin !== undefined) return headers.origin === ownOrigin;
  return headers.fetchSite === 'same-origin';
}

/**
 * Refuses what another site could make a browser send: an unsafe method needs the own origin, and a body that no plain
 * form can make (JSON, or multipart with the header that only a script can set).
 */
export const sameOrigin =
  (ownOrigin: string): RequestHandler =>
  (req, _res, next) => {
    if (SAFE.has(req.method)) return next();
    if (!comesFromOwnOrigin({ origin: req.get('origin'), fetchSite: req.get('sec-fetch-site') }, ownOrigin))
      return next(
        new AppError('origin-refused', 'Nothing was changed. Open Ferrule at its own address and try again.'),
      );
    const hasBody = req.get('content-length') !== undefined || req.get('transfer-encoding') !== undefined;
    const plainForm =
      hasBody &&
      req.get('content-length') !== '0' &&
      !req.is('application/json') &&
      !(req.is('multipart/form-data') && req.get('x-ferrule') === '1');
    if (plainForm) return next(new AppError('malformed-request', 'Send JSON.'));
    next();
  };
