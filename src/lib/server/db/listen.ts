import pg from 'pg';
import { env } from '../env';
import { log } from '../log';

type Hear = () => void;

const CHANNEL = 'endplay_bench';
const AGAIN_MS = 1000;

const heard = new Map<string, Set<Hear>>();
let line: pg.Client | undefined;
let later: NodeJS.Timeout | undefined;

const all = () => [...heard.values()].flatMap((each) => [...each]);

/** One connection that hears for everybody; lost, it is opened again and all are told, for they may have missed something. */
function open(): void {
	if (line || heard.size === 0) return;
	const client = (line = new pg.Client({ connectionString: env().DATABASE_URL }));
	const lost = (fault?: Error) => {
		if (line !== client) return;
		line = undefined;
		if (fault) log().warn({ fault: fault.message }, 'the line that hears of changes was lost');
		void client.end().catch(() => undefined);
		later = setTimeout(open, AGAIN_MS);
		later.unref();
	};
	client.on('error', lost);
	client.on('end', () => lost());
	client.on('notification', ({ payload = '' }) => heard.get(payload)?.forEach((hear) => hear()));
	client
		.connect()
		.then(() => client.query(`listen ${CHANNEL}`))
		.then(() => all().forEach((hear) => hear()))
		.catch(lost);
}

/** Nobody hears any more: the connection is given back. */
export async function closeLine(): Promise<void> {
	clearTimeout(later);
	heard.clear();
	const client = line;
	line = undefined;
	await client?.end().catch(() => undefined);
}

/** Hears every committed change about a thing, by its name ("shop:donor"); returns how to stop. */
export function listenTo(name: string, hear: Hear): () => void {
	heard.set(name, (heard.get(name) ?? new Set()).add(hear));
	open();
	return () => {
		const left = heard.get(name);
		left?.delete(hear);
		if (left?.size === 0) heard.delete(name);
		if (heard.size === 0) void closeLine();
	};
}
