import { pino, type Logger } from 'pino';

/** Structured log without secrets: cookies, authorization and anything named like a password or token is cut. */
export const createLogger = (level: string): Logger =>
  pino({
    level,
    redact: {
      paths: [
        'req.headers.cookie',
        'req.headers.authorization',
        'res.headers["set-cookie"]',
        '*.password',
        '*.newPassword',
        '*.currentPassword',
        '*.token',
        '*.code',
      ],
      censor: '[cut]',
    },
  });

export type { Logger };
