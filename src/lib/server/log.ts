import pino from 'pino';
import { env } from './env';

let logger: pino.Logger | undefined;

/** Structured log on standard output; letters, tokens, addresses and photos never go in. */
export const log = (): pino.Logger => (logger ??= pino({ level: env().LOG_LEVEL }));

const ADDRESS = /[^\s<>"'/]+@[^\s<>"'/]+\.[a-z]{2,}/gi;

/** A text of somebody else's making, without the e-mail addresses in it. */
export const unnamed = (text: string): string => text.replace(ADDRESS, '(address)');

/** What a fault says of itself; of a failed query never the values that it carried. */
export function faultSaid(fault: unknown): Record<string, unknown> {
	if (!(fault instanceof Error)) return { fault: 'not an error' };
	const frames = fault.stack?.split('\n').filter((line) => /^\s+at /.test(line));
	const query = 'query' in fault && 'params' in fault;
	const { code, constraint } = fault as { code?: unknown; constraint?: unknown };
	return {
		fault: query ? `Failed query: ${fault.query}` : unnamed(`${fault.name}: ${fault.message}`),
		...(code ? { code, constraint } : {}),
		...(fault.cause ? { cause: faultSaid(fault.cause) } : {}),
		at: frames?.slice(0, 12).map((line) => line.trim())
	};
}

/** Logs a fault that nobody expected. Returns its number, to be told to whoever ran into it. */
export function logFault(fault: unknown, where: Record<string, unknown>): string {
	const id = crypto.randomUUID();
	log().error({ id, ...where, ...faultSaid(fault) });
	return id;
}
