import 'server-only';
import pino from 'pino';

/** The server's own log. Never a password, a token or a reading; what people did stands in the record. */
export const log = pino({ name: 'halflight', level: process.env.LOG_LEVEL ?? 'info' });
