import pino from 'pino';
import { env } from './env';

let logger: pino.Logger | undefined;

/** Structured log on standard output; letters, tokens and photos never go in. */
export const log = (): pino.Logger => (logger ??= pino({ level: env().LOG_LEVEL }));
