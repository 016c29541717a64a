import 'server-only';
import pino from 'pino';

/** One JSON line an event; what could let a reader act as somebody else is left out. */
export const log = pino({
  level: process.env.LOG_LEVEL ?? 'info',
  redact: {
    paths: [
      'password',
      'secret',
      'token',
      'link',
      '*.password',
      '*.secret',
      '*.token',
      '*.link',
      'headers.cookie',
      'headers.authorization',
      'headers["set-cookie"]',
      '*.headers.cookie',
      '*.headers.authorization',
      '*.headers["set-cookie"]',
    ],
    remove: true,
  },
});
