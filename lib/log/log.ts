import pino from 'pino';
import { plainError } from './plain-error';

/**
 * The program's log: one JSON object a line on standard error. It holds ids, never names, addresses or what people wrote.
 */
export const log = pino(
  {
    level: process.env.LOG_LEVEL || (process.env.NODE_ENV === 'test' ? 'silent' : 'info'),
    base: undefined,
    serializers: { err: plainError },
    redact: {
      paths: ['email', 'password', 'name', 'cookie', 'authorization', '*.email', '*.password'],
      remove: true,
    },
  },
  pino.destination({ dest: 2, sync: false }),
);
