import pg from 'pg';
import { engineKey, numberKey } from '../../../src/lib/codes/number';
import { makeTag } from '../../../src/lib/codes';
import { engineLexemes } from '../../../src/lib/donors/lexemes';
import { searchWords } from '../../../src/lib/parts/search-words';
import { kind } from '../../../src/lib/trade';
import { Random } from './random';
import { TODAY, type World, type WorldDonor, type WorldPart, type WorldShop } from './world';

/** Rows for COPY ... FROM STDIN, as pg takes a thing that it can submit. */
class CopyIn {
	readonly done: Promise<void>;
	#resolve!: () => void;
	#reject!: (fault: Error) => void;

	constructor(
		readonly text: string,
		readonly rows: string
	) {
		this.done = new Promise((resolve, reject) => {
			this.#resolve = resolve;
			this.#reject = reject;
		});
	}
	submit(connection: { query(text: string): void }) {
		connection.query(this.text);
	}
	handleCopyInResponse(connection: {
		sendCopyFromChunk(chunk: Buffer): void;
		endCopyFrom(): void;
	}) {
		connection.sendCopyFromChunk(Buffer.from(this.rows));
		connection.endCopyFrom();
	}
	handleCommandComplete() {}
	handleReadyForQuery() {
		this.#resolve();
	}
	handleError(fault: Error) {
		this.#reject(fault);
	}
}

type Value = string | number | boolean | null | undefined | readonly string[];

function cell(value: Value): string {
	if (value === null || value === undefined) return '\\N';
	if (Array.isArray(value)) return cell(`{${value.map((one) => JSON.stringify(one)).join(',')}}`);
	return String(value).replace(
		/[\\\t\n\r]/g,
		(one) => ({ '\t': '\\t', '\n': '\\n', '\r': '\\r' })[one] ?? '\\\\'
	);
}

const BATCH = 40_000;

/** Copies rows into a table, named by the columns of the first. */
export async function copyInto(
	client: pg.Client,
	table: string,
	rows: Iterable<Record<string, Value>>
) {
	let text = '';
	let columns = '';
	let count = 0;
	const send = async () => {
		const copy = new CopyIn(`copy ${table} (${columns}) from stdin`, text);
		client.query(copy as unknown as pg.Submittable);
		await copy.done;
		text = '';
	};
	for (const row of rows) {
		columns ||= Object.keys(row).join(', ');
		text += `${Object.values(row).map(cell).join('\t')}\n`;
		if (++count % BATCH === 0) await send();
	}
	if (text) await send();
}

const when = (time: number) => new Date(time).toISOString();

function* tagsFor(count: number, random: Random): Generator<string> {
	const used = new Set<string>();
	while (used.size < count) {
		const tag = makeTag(() => random.below(1 << 30));
		if (used.has(tag)) continue;
		used.add(tag);
		yield tag;
	}
}

export interface Tagged {
	bins: string[];
	parts: Map<number, string>;
}

function donorRow({ catalogue }: World, donor: WorldDonor) {
	const { maker, model, cc, class: engineClass, shaft } = catalogue.families[donor.family]!;
	const plate = { maker, model, typeCode: '', dateCode: '', serial: donor.serial };
	return {
		shop_id: donor.shop,
		id: donor.id,
		number: donor.number,
		maker,
		model,
		engine_key: engineKey(`${maker} ${model}`),
		serial: donor.serial,
		displacement_cc: cc,
		shaft,
		engine_class: engineClass,
		fittings: ['recoil', '12 V start', 'charging', 'mains start'],
		search_words: engineLexemes({ ...plate, displacementCc: cc, offMachine: '', shaft }),
		cause: donor.cause,
		sureness: 'seen',
		state: donor.open ? 'whole' : 'stripped',
		taken_in_at: when(donor.takenIn)
	};
}

function partRow({ catalogue }: World, part: WorldPart, tag: string, binId: number | null) {
	const { maker, model } = catalogue.families[part.family]!;
	const engine = part.donor ? '' : `${maker} ${model}`;
	const numbers = part.number ? [part.number] : [];
	const words = searchWords({ label: '', numbers, note: part.note, engine, set: '' });
	return {
		shop_id: part.shop,
		id: part.id,
		tag,
		kind: part.kind,
		donor_id: part.donor?.id ?? null,
		engine,
		engine_key: engineKey(`${maker} ${model}`),
		grade: part.grade,
		state: part.state,
		bin_id: binId,
		numbers,
		number_keys: numbers.map(numberKey),
		note: part.note,
		held_for: part.state === 'held' ? 'the bench' : null,
		held_until: part.state === 'held' ? when(TODAY) : null,
		out_as: part.state === 'out' ? 'sold' : null,
		scrap_reason: part.state === 'scrapped' ? 'worn' : null,
		search_words: words,
		pulled_at: when(part.pulled),
		changed_at: when(part.pulled)
	};
}

function* priceRows({ catalogue }: World, shop: WorldShop, random: Random) {
	const seen = new Set<string>();
	for (const { kind: id, family, number } of shop.parts) {
		const key = `${id} ${number || family}`;
		if (seen.has(key) || random.chance(0.4)) continue;
		seen.add(key);
		const { maker, model } = catalogue.families[family]!;
		const { newLowCents, newHighCents } = kind(id);
		const newCents = Math.round(newLowCents + random.next() * (newHighCents - newLowCents));
		yield {
			shop_id: shop.id,
			kind: id,
			engine: number ? '' : `${maker} ${model}`,
			engine_key: number ? '' : engineKey(`${maker} ${model}`),
			number,
			number_key: numberKey(number),
			new_cents: newCents,
			copy_cents: random.chance(0.4) ? Math.round(newCents * 0.4) : null,
			source: 'list',
			seen_on: '2026-10-01',
			changed_at: when(TODAY)
		};
	}
}

const INDEXES = {
	found_by_words: 'on found_by using gin (shop_words(shop_id, words)) with (fastupdate = off)',
	found_number_grams: 'on found_number using gin (key_grams(shop_id, key)) with (fastupdate = off)',
	found_by_kind: `on found_by (shop_id, kind, stands, grade_no, aged, part_id)
		include (proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, same_no)`
};

/** Loads a world as the superuser; the rows that parts are found by are made by the product's own functions. */
export async function loadWorld(
	client: pg.Client,
	world: World,
	say: (line: string) => void
): Promise<Tagged[]> {
	const random = new Random(77);
	await client.query(`set session_replication_role = replica; set synchronous_commit = off`);
	for (const name of Object.keys(INDEXES)) await client.query(`drop index ${name}`);
	await copyInto(
		client,
		'shop',
		world.shops.map(({ id }) => ({
			id,
			slug: `bench-${id}`,
			name: `Bench ${id}`,
			currency: 'USD',
			time_zone: 'UTC',
			units: 'inch',
			season: 'normal',
			created_at: when(TODAY)
		}))
	);
	await copyInto(
		client,
		'member',
		world.shops.map(({ id }) => ({
			shop_id: id,
			id,
			name: 'A script',
			role: 'owner',
			joined_at: when(TODAY)
		}))
	);
	const keyOf = (family: number) => {
		const { maker, model } = world.catalogue.families[family]!;
		return engineKey(`${maker} ${model}`);
	};
	const tagged: Tagged[] = world.shops.map(() => ({ bins: [], parts: new Map() }));
	let binId = 0;
	const firstBin: number[] = [];
	for (const [at, shop] of world.shops.entries()) {
		firstBin.push(binId + 1);
		const tags = [...tagsFor(shop.bins.length + shop.parts.length, random)];
		const bins = shop.bins.map((address, n) => ({
			shop_id: shop.id,
			id: ++binId,
			tag: tags[n]!,
			address,
			size: 'm',
			created_at: when(TODAY)
		}));
		tagged[at]!.bins = bins.map(({ tag }) => tag);
		shop.parts.forEach(({ id }, n) => tagged[at]!.parts.set(id, tags[shop.bins.length + n]!));
		await copyInto(
			client,
			'tag',
			tags.map((code, n) => ({
				shop_id: shop.id,
				code,
				what: n < bins.length ? 'bin' : 'part',
				minted_at: when(TODAY)
			}))
		);
		await copyInto(client, 'bin', bins);
		await copyInto(
			client,
			'donor',
			shop.donors.map((donor) => donorRow(world, donor))
		);
		await copyInto(client, 'price', priceRows(world, shop, random));
	}
	say('donors, bins and prices are in');
	const all = world.shops.flatMap((shop) => shop.parts).sort((a, b) => a.id - b.id);
	await copyInto(
		client,
		'part',
		(function* () {
			for (const part of all)
				yield partRow(
					world,
					part,
					tagged[part.shop - 1]!.parts.get(part.id)!,
					part.bin === null ? null : firstBin[part.shop - 1]! + part.bin
				);
		})()
	);
	await copyInto(
		client,
		'proof',
		(function* () {
			for (const { shop, id, proved, pulled } of all)
				if (proved)
					yield {
						shop_id: shop,
						part_id: id,
						how: proved,
						passed: true,
						member_id: shop,
						at: when(pulled)
					};
		})()
	);
	await copyInto(
		client,
		'found_number',
		(function* () {
			for (const { shop, id, number, kind, family } of all)
				if (numberKey(number))
					yield {
						shop_id: shop,
						key: numberKey(number),
						part_id: id,
						kind,
						engine_key: keyOf(family)
					};
		})()
	);
	for (const { id, parts } of world.shops) {
		const here = new Set(parts.map(({ number }) => number));
		const chains = [...world.catalogue.replaced].filter(
			([, next]) => here.has(next) || here.has(world.catalogue.replaced.get(next) ?? '')
		);
		await copyInto(
			client,
			'supersession',
			chains
				.map(([old, next]) => ({
					shop_id: id,
					old_number: old,
					old_key: numberKey(old),
					new_number: next,
					new_key: numberKey(next),
					member_id: id,
					at: when(TODAY)
				}))
				.filter((row) => row.old_key !== row.new_key)
		);
	}
	say('parts are in');
	await client.query('analyze');
	for (const { id, parts } of world.shops) {
		for (let at = 0; at < parts.length; at += 5000)
			await client.query('select follow_parts($1, $2)', [
				id,
				parts.slice(at, at + 5000).map((part) => part.id)
			]);
	}
	await mixHeap(client);
	for (const [name, made] of Object.entries(INDEXES))
		await client.query(`create index ${name} ${made}`);
	for (const { id, parts } of world.shops)
		await client.query('select follow_words($1, $2)', [id, parts.map((part) => part.id)]);
	for (const table of [
		'shop',
		'member',
		'bin',
		'donor',
		'price',
		'part',
		'proof',
		'supersession',
		'shop_word'
	])
		await client.query(
			`select setval(pg_get_serial_sequence('${table}', 'id'), (select coalesce(max(id), 0) + 1 from ${table}))`
		);
	await client.query('set session_replication_role = default');
	await client.query('vacuum analyze');
	say('found_by and its indexes are made');
	return tagged;
}

/** The rows of all shops in the order of time, as years of work would leave them. */
async function mixHeap(client: pg.Client) {
	await client.query('create unlogged table mixed as select * from found_by');
	await client.query('truncate found_by');
	await client.query('insert into found_by select * from mixed order by part_id');
	await client.query('drop table mixed');
}
