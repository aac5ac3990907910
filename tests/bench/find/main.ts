import { loadavg } from 'node:os';
import { setTimeout as wait } from 'node:timers/promises';
import pg from 'pg';
import { FindQuery } from '../../../src/lib/find/input';
import { readSearch } from '../../../src/lib/find/plan';
import { questionOf } from '../../../src/lib/server/find/question';
import { DEFAULT_POLICY } from '../../../src/lib/people/policy';
import { tokenHash } from '../../../src/lib/server/people/hash';
import { makeCatalogue } from './catalogue';
import { loadWorld } from './load';
import { peers } from './peers';
import { makeQuestions, type Question } from './questions';
import { percentile, scored, type Answered, type ClassScore } from './score';
import { makeWorld, shopSizes, type World } from './world';

export interface Options {
	parts: number;
	shops: number;
	seed: number;
	peers: boolean;
	urls: { admin: string; app: string };
}

const KEY = (shop: number) => `bench-key-of-shop-${shop}`;
const say = (line: string) => process.stdout.write(`${line}\n`);

async function asAdmin<T>({ urls }: Options, work: (client: pg.Client) => Promise<T>): Promise<T> {
	const client = new pg.Client({ connectionString: urls.admin });
	await client.connect();
	try {
		return await work(client);
	} finally {
		await client.end();
	}
}

/** The same world on every run; it is loaded once. */
export async function prepare(options: Options): Promise<World> {
	const sizes = shopSizes(options.shops, options.parts);
	const world = makeWorld(makeCatalogue(5), sizes, 9);
	await asAdmin(options, async (client) => {
		const { rows } = await client.query('select count(*)::int as n from shop');
		if (rows[0].n > 0) return;
		say(`loading ${options.parts} parts of ${options.shops} shops`);
		await loadWorld(client, world, say);
		for (const { id } of world.shops)
			await client.query(
				'insert into api_key (shop_id, member_id, token_hash, created_at) values ($1, $1, $2, now())',
				[id, tokenHash(KEY(id))]
			);
	});
	return world;
}

const PASSES = 3;

async function timed(
	questions: readonly Question[],
	ask: (question: Question) => Promise<Omit<Answered, 'ms'>>
) {
	const answers: Answered[][] = questions.map(() => []);
	// connections that the server closed while we were counting are noticed before they are used
	await wait(200);
	for (let pass = 0; pass <= PASSES; pass += 1)
		for (const [at, question] of questions.entries()) {
			const began = performance.now();
			const answer = await ask(question);
			if (pass > 0) answers[at]!.push({ ...answer, ms: performance.now() - began });
		}
	return answers;
}

const overHttp =
	(base: string, shop: number) =>
	async ({ typed }: Question) => {
		const answer = await fetch(`${base}/api/bench-${shop}/parts?q=${encodeURIComponent(typed)}`, {
			headers: { Authorization: `Bearer ${KEY(shop)}` }
		});
		const { items, total } = (await answer.json()) as { items: { id: number }[]; total: number };
		return { ids: items.map(({ id }) => id), total };
	};

/** The search function alone, as the app's own role, prepared once. */
const inSql =
	(client: pg.Client, shop: number) =>
	async ({ typed }: Question) => {
		const plan = readSearch(typed);
		const { rows } = await client.query({
			name: 'find',
			text: 'select find_on_shelf($1::json) as answer',
			values: [questionOf(shop, plan, FindQuery.parse({ q: typed }), DEFAULT_POLICY)]
		});
		const { page, total } = rows[0].answer as { page: { id: number }[] | null; total: number };
		return { ids: (page ?? []).map(({ id }) => id), total };
	};

const ilike =
	(client: pg.Client, shop: number) =>
	async ({ typed }: Question) => {
		const words = typed.split(/\s+/).map((word) => `%${word.replace(/[\\%_]/g, '\\$&')}%`);
		const text = `concat_ws(' ', p.kind, p.tag, array_to_string(p.numbers, ' '), p.note, d.maker, d.model, round(d.displacement_cc)::text || 'cc', p.engine)`;
		const fits = words.map((_, at) => `${text} ilike $${at + 2}`).join(' and ');
		const { rows } = await client.query(
			`select p.id, count(*) over () as total from part p left join donor d on d.shop_id = p.shop_id and d.id = p.donor_id where p.shop_id = $1 and p.state not in ('out', 'scrapped') and ${fits} order by p.id limit 10`,
			[shop, ...words]
		);
		return { ids: rows.map(({ id }) => Number(id)), total: Number(rows[0]?.total ?? 0) };
	};

const figures = ({ recall, mrr, p50, p95, p99 }: ClassScore) =>
	`${recall.toFixed(3)} ${mrr.toFixed(3)} ${[p50, p95, p99].map((ms) => ms.toFixed(2).padStart(8)).join('')}`;

function print(title: string, scores: readonly ClassScore[]) {
	say(`\n${title}\n${'class'.padEnd(20)}    n recall mrr        p50     p95     p99 ms`);
	for (const score of scores)
		say(`${score.class.padEnd(20)} ${`${score.count}`.padStart(4)} ${figures(score)}`);
}

async function keyLookup(client: pg.Client, shop: number, ids: readonly number[]): Promise<number> {
	const times: number[] = [];
	for (const id of ids.slice(0, 400)) {
		const began = performance.now();
		await client.query({
			name: 'key',
			text: 'select * from part where shop_id = $1 and id = $2',
			values: [shop, id]
		});
		times.push(performance.now() - began);
	}
	return percentile(times, 0.5);
}

async function eightAtOnce(
	questions: readonly Question[],
	ask: (question: Question) => Promise<unknown>
): Promise<number> {
	const began = performance.now();
	let next = 0;
	const total = questions.length * 2;
	const caller = async () => {
		while (next < total) await ask(questions[next++ % questions.length]!);
	};
	await Promise.all(Array.from({ length: 8 }, caller));
	return (total / (performance.now() - began)) * 1000;
}

/** Runs every question against everything; how many goals were missed. */
export async function run(options: Options, world: World, base: string): Promise<number> {
	let missed = 0;
	const goal = (said: string, met: boolean) => {
		if (!met) missed += 1;
		say(`${met ? 'met   ' : 'missed'} ${said}`);
	};
	say(`load before: ${loadavg()[0]!.toFixed(1)}`);
	const middling = Math.max(2, Math.floor(options.shops / 2));
	for (const [which, most] of [
		[1, 10],
		[middling, 4]
	] as const) {
		const shop = world.shops[which - 1]!;
		const tags = await asAdmin(options, async (client) => {
			const { rows } = await client.query('select id, tag from part where shop_id = $1', [which]);
			return { bins: [], parts: new Map(rows.map(({ id, tag }) => [Number(id), tag as string])) };
		});
		const questions = makeQuestions(world, shop, tags, options.seed);
		const http = scored(questions, await timed(questions, overHttp(base, which)));
		print(`Through HTTP, shop of ${shop.size}`, http);
		const client = new pg.Client({ connectionString: options.urls.app });
		await client.connect();
		await client.query(`select set_config('endplay.shop', $1, false)`, [`${which}`]);
		const sql = scored(questions, await timed(questions, inSql(client, which)));
		print('The search function alone, without the shop’s own words for spelling', sql);
		const key = await keyLookup(
			client,
			which,
			shop.parts.map(({ id }) => id)
		);
		say(
			`key look-up p50 ${key.toFixed(3)} ms; ${(await eightAtOnce(questions, overHttp(base, which))).toFixed(0)} answers a second with eight callers`
		);
		const few = questions.filter((_, at) => at % 12 === 0);
		print('ILIKE, every twelfth question', scored(few, await timed(few, ilike(client, which))));
		await client.end();
		const [all, bare] = [http.at(-1)!, sql.at(-1)!];
		const others = options.peers ? await peers(shop, world, tags, questions) : [];
		for (const { name, built, scores } of others) print(`${name}, ${built}`, scores);
		say('');
		goal(`recall in the first ten ${all.recall.toFixed(3)} at least 0.99`, all.recall >= 0.99);
		for (const one of http.filter(({ recall }) => recall < 0.97))
			goal(`recall of ${one.class} ${one.recall.toFixed(3)} at least 0.97`, false);
		goal(`mean reciprocal rank ${all.mrr.toFixed(3)} at least 0.98`, all.mrr >= 0.98);
		goal(
			`p95 through HTTP ${all.p95.toFixed(2)} ms at most ${most} ms on a quiet machine`,
			all.p95 <= most
		);
		goal(`p50 in SQL ${bare.p50.toFixed(2)} ms at most ten key look-ups`, bare.p50 <= 10 * key);
		for (const { name, scores } of others)
			for (const theirs of scores) {
				const ours = http.find((one) => one.class === theirs.class)!;
				if (ours.recall < theirs.recall - 1e-9)
					goal(
						`${theirs.class}: ${name} ${theirs.recall.toFixed(3)} over ours ${ours.recall.toFixed(3)}`,
						false
					);
			}
	}
	say(`load after: ${loadavg()[0]!.toFixed(1)}`);
	return missed;
}
