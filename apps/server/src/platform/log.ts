import { type Logger, pino } from 'pino';

export type { Logger };

/** One line of JSON an event. Bodies, cookies and addresses of people never get there. */
export const createLog = (level = 'info'): Logger =>
  pino({ level, base: null, redact: { paths: ['req.headers', 'res.headers', '*.password', '*.passwordHash', '*.token'], remove: true } });
