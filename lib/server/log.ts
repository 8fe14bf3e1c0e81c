import pino from 'pino';

/** The server's log, one JSON line an event. Never holds passwords, tokens, letters or request bodies. */
export const log = pino({
  level: process.env.LOG_LEVEL ?? (process.env.NODE_ENV === 'test' ? 'silent' : 'info'),
  redact: ['*.password', '*.token', '*.cookie', '*.authorization'],
});
