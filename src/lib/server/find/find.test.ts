import { FindQuery } from '$lib/find/input';
import { FitNote } from '$lib/parts/fits';
import { CAUSES, chanceLevel, kind, kinds } from '$lib/trade';
import { inArray, sql } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { addBin } from '../bins';
import { inShop } from '../context';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { parkDonor, takeIn } from '../donors';
import { holdPart, logOldStock, noteFit, pullPart, scrapPart, sellPart } from '../parts';
import { part } from '../parts/tables';
import { replaceNumber } from '../prices';
import { exportParts, findParts } from './index';
import { asked } from './tables';

const ask = (shop: TestShop, query: object) => findParts(shop.ctx, FindQuery.parse(query));
const tags = async (shop: TestShop, q: string) =>
	(await ask(shop, { q })).items.map((item) => item.tag);

/** A few parts with everything that they are found by; both shops get the same, with another maker. */
async function stock(shop: TestShop, maker: string) {
	const { ctx } = shop;
	for (const address of ['K3-1', 'K3-2', 'L1-1'])
		await addBin(ctx, { address, size: 'm', purpose: '', place: '', red: false });
	const engine = { maker, model: 'HX-270V', class: 'WB' as const, fittings: ['recoil' as const] };
	const release = { route: 'own' as const, document: '', on: '2026-03-01' };
	const donor = await takeIn(ctx, { ...engine, cause: 'thrown-rod', sureness: 'seen', release });
	await parkDonor(ctx, donor.number, {});
	const fresh = await takeIn(ctx, { ...engine, model: 'QB 500', cause: 'worn', sureness: 'seen' });
	const coil = await pullPart(ctx, donor.number, {
		kind: 'coil',
		grade: 'good used',
		numbers: ['TN-4471-O2'],
		bin: 'K3-1',
		note: 'two legs, insulation like new'
	});
	const old = (kind: string, more: object) =>
		logOldStock(ctx, { kind, grade: 'usable', engine: `${maker} 21L`, ...more });
	return {
		donor,
		fresh,
		coil: coil.tag,
		carb: (await old('carb-float', { bin: 'K3-2', numbers: ['8800-15'], grade: 'clean used' })).tag,
		recoil: (await old('recoil', { bin: 'L1-1', note: 'three ears, rope frayed' })).tag,
		loose: (await old('recoil', { grade: 'untested' })).tag,
		solenoid: (await old('solenoid', { bin: 'L1-1' })).tag,
		gone: (await old('muffler', {})).tag
	};
}

describe('finding parts', () => {
	let ours: TestShop;
	let theirs: TestShop;
	let here: Awaited<ReturnType<typeof stock>>;
	let there: Awaited<ReturnType<typeof stock>>;

	beforeAll(async () => {
		({ ours, theirs } = await testShops());
		here = await stock(ours, 'Ondrake');
		there = await stock(theirs, 'Pellwyn');
		await sellPart(ours.ctx, here.gone, { cents: 1500 });
		const scrapped = await logOldStock(ours.ctx, { kind: 'muffler', grade: 'usable' });
		await scrapPart(ours.ctx, scrapped.tag, { reason: 'rusted through' });
	});

	it('finds by a tag, with O typed for 0 and in any case, also by the tag of a box', async () => {
		expect(await tags(ours, here.coil)).toEqual([here.coil]);
		const typed = here.coil.toLowerCase().replaceAll('0', 'o').replaceAll('1', 'l');
		expect(await tags(ours, ` ${typed.slice(0, 2)}-${typed.slice(2)}`)).toEqual([here.coil]);
		expect(await tags(ours, here.donor.tag)).toEqual([here.coil]);
	});

	it.each(['TN-4471-02', 'tn447102', 'TN 4471 O2', 'tn.4471/o2', '4471', '447102', 'TN44'])(
		'finds a part number typed as %s',
		async (typed) => {
			const found = await ask(ours, { q: typed });
			expect(found.items.map((item) => item.tag)).toEqual([here.coil]);
			expect(found.total).toBe(1);
		}
	);

	it.each<[string, 'carb' | 'recoil' | 'solenoid' | 'coil']>([
		['carberator', 'carb'],
		['recoyl', 'recoil'],
		['selonoid', 'solenoid'],
		['pull start', 'recoil'],
		['magneto', 'coil'],
		['hx270', 'coil'],
		['HX-270V coil', 'coil'],
		['anything off a d01', 'coil'],
		['frayd rope', 'recoil'],
		['insulaton', 'coil'],
		['the recoil thing with three ears', 'recoil']
	])('%s finds the %s first', async (q, which) => {
		expect((await tags(ours, q))[0]).toBe(here[which]);
	});

	it('takes a shelf or a bin for the place', async () => {
		expect((await tags(ours, 'k3')).sort()).toEqual([here.coil, here.carb].sort());
		expect(await tags(ours, 'K3-2')).toEqual([here.carb]);
		expect(await tags(ours, 'coil k3')).toEqual([here.coil]);
	});

	it('keeps to what a word narrows, and widens to the kind when nothing has the word', async () => {
		expect(await tags(ours, 'recoil frayed')).toEqual([here.recoil]);
		expect((await tags(ours, 'recoil zyzzyx')).sort()).toEqual([here.recoil, here.loose].sort());
	});

	it('leaves out what is scrapped or out, shelf first, unless the state is asked', async () => {
		const all = await ask(ours, {});
		expect(all.items.map((item) => item.state)).toEqual([...Array(4).fill('shelved'), 'pulled']);
		expect(all.facets.state).toContainEqual({ value: 'out', count: 1 });
		expect((await ask(ours, { state: 'out' })).items.map((item) => item.tag)).toEqual([here.gone]);
		await holdPart(ours.ctx, here.solenoid, { for: 'Wenna' });
		expect((await ask(ours, {})).items.at(-1)).toMatchObject({ state: 'held', heldBy: 'Wenna' });
	});

	it('narrows by kind, grade, bin and donor; each facet counts without itself', async () => {
		const grades = await ask(ours, { kind: 'recoil', grade: 'usable' });
		expect(grades.items.map((item) => item.tag)).toEqual([here.recoil]);
		expect(grades.facets.grade).toEqual([
			{ value: 'usable', count: 1 },
			{ value: 'untested', count: 1 }
		]);
		expect(grades.facets.kind).toContainEqual({
			value: 'recoil',
			count: 1,
			said: kind('recoil').name
		});
		expect(grades.facets.bin).toEqual([{ value: 'L1-1', count: 1 }]);
		expect((await ask(ours, { donor: 'd1' })).total).toBe(1);
		expect((await ask(ours, { donor: here.donor.tag })).total).toBe(1);
		expect((await ask(ours, { donor: there.donor.tag })).total).toBe(0);
		expect((await ask(ours, { bin: 'k3-1' })).total).toBe(1);
	});

	it('names donors that still carry one, with the minutes, and the nearest kinds', async () => {
		const found = await ask(ours, { q: 'fuel tank' });
		expect(found.items).toEqual([]);
		expect(found.donors.map((one) => one.number).sort()).toEqual(['D1', 'D2']);
		expect(found.donors.every((one) => one.minutes > 0 && one.kind === 'fuel-tank')).toBe(true);
		expect(found.nearest[0]).toMatchObject({ kind: 'carb-float', count: 1 });
		const coils = await ask(ours, { q: 'coil' });
		expect(coils.donors.map((one) => one.number)).toEqual(['D2']);
		expect((await ask(ours, { q: 'xyzzy plugh' })).nearest.length).toBeGreaterThan(0);
	});

	it('never shows the other shop', async () => {
		for (const q of ['', 'pellwyn', 'coil', 'd1', 'k3', there.coil, there.donor.tag, 'TN447102']) {
			const found = await ask(ours, { q });
			expect(JSON.stringify(found)).not.toMatch(/pellwyn/i);
			expect(found.items.map((item) => item.tag)).not.toContain(there.coil);
		}
		expect(await tags(theirs, 'coil')).toEqual([there.coil]);
	});

	it.each([
		`'; drop table part; --`,
		`%`,
		`_`,
		`\\`,
		`"'\\%_`,
		'{a,b}',
		'a\0b',
		'☃ 🔧 �',
		'\ud800',
		'ﬁlter Ⅻ',
		'x'.repeat(10_000),
		'a b c d e f g h i j k l m n o p q r s t u v w x y z '.repeat(200)
	])('answers whatever is typed, %$', async (q) => {
		const found = await ask(ours, { q, bin: `%'_\\`.slice(0, q.length) });
		expect(found.total).toBe(0);
		expect((await ask(ours, { q })).nearest.length + found.nearest.length).toBeGreaterThan(0);
	});
});

describe('pages', () => {
	it('run through more than 60 parts without a gap or a repeat, oldest first among equals', async () => {
		const { ours } = await testShops();
		const made = await inShop(ours.ctx, async (tx, ctx) => {
			const all: string[] = [];
			for (let at = 0; at < 63; at++) {
				const now = new Date(ctx.now.getTime() - (at % 7) * 86_400_000);
				all.push((await logOldStock({ ...ctx, now }, { kind: 'coil', grade: 'usable' })).tag);
			}
			await tx
				.update(part)
				.set({ state: 'missing' })
				.where(inArray(part.tag, all.slice(0, 9)));
			return all;
		});
		const seen: string[] = [];
		const states: string[] = [];
		let cursor: string | null = null;
		do {
			const found = await ask(ours, { q: 'coil', limit: 10, cursor: cursor ?? undefined });
			expect(found.total).toBe(63);
			seen.push(...found.items.map((item) => item.tag));
			states.push(...found.items.map((item) => item.state));
			cursor = found.next;
		} while (cursor);
		expect(new Set(seen).size).toBe(63);
		expect([...seen].sort()).toEqual([...made].sort());
		expect(states.indexOf('missing')).toBe(54);
		expect(seen[0]).toBe(made[13]);
	});
});

describe('what is only asked', () => {
	it('counts looking in vain as a call, one for each person, kind and day', async () => {
		const { ours } = await testShops();
		const counter = await ours.as('counter');
		const look = (ctx: typeof counter, q: string) => findParts(ctx, FindQuery.parse({ q }));
		for (const q of ['carberator', 'carb', 'carb k3', 'starter under 50']) await look(counter, q);
		await look(ours.ctx, 'carb');
		await look({ ...counter, now: new Date('2026-03-15T12:00:00Z') }, 'carb');
		await logOldStock(ours.ctx, { kind: 'coil', grade: 'usable' });
		await look(counter, 'coil');
		const rows = await inShop(ours.ctx, (tx) => tx.select().from(asked));
		const said = rows.map(({ memberId, kind, on }) => `${memberId} ${kind} ${on}`).sort();
		expect(said).toEqual(
			[
				`${counter.memberId} carb-float 2026-03-14`,
				`${counter.memberId} carb-float 2026-03-15`,
				`${counter.memberId} starter12 2026-03-14`,
				`${ours.ctx.memberId} carb-float 2026-03-14`
			].sort()
		);
	});

	it('follows what was tried on another engine, one way or both, and what does not fit', async () => {
		const { ours } = await testShops();
		const old = async (engine: string) =>
			(await logOldStock(ours.ctx, { kind: 'coil', grade: 'usable', engine })).tag;
		const tarn = await old('Ondrake TARN-21L');
		const fern = await old('Sollane FERN-9');
		const note = (tag: string, more: object) =>
			noteFit(ours.ctx, tag, FitNote.parse({ engine: 'Pellwyn 8HX', fits: 'yes', ...more }));
		await note(tarn, { ways: 'both' });
		await note(fern, { fits: 'no', because: 'leg spacing' });
		const [first] = (await ask(ours, { q: 'coil 8HX' })).items;
		expect(first).toMatchObject({
			tag: tarn,
			reason: expect.stringContaining('tried there, fits')
		});
		expect((await tags(ours, 'coil 8HX')).includes(fern)).toBe(false);
		const pell = await old('Pellwyn 8HX');
		expect((await tags(ours, 'coil TARN-21L')).sort()).toEqual([tarn, pell].sort());
		const both = await ask(ours, { q: 'coil 8hx' });
		expect(both.items.map(({ tag }) => tag)).toEqual([pell, tarn]);
	});

	it('knows what a number was replaced by, and not the other way round', async () => {
		const { ours } = await testShops();
		const part = async (number: string) =>
			(await logOldStock(ours.ctx, { kind: 'coil', grade: 'usable', numbers: [number] })).tag;
		const [old, next] = [await part('TN-100'), await part('TN-300')];
		const replace = (number: string, by: string, ways: 'one' | 'both' = 'one') =>
			replaceNumber(ours.ctx, { number, by, ways, note: '' });
		await replace('TN-100', 'TN-200');
		await replace('TN-200', 'TN-300');
		expect(await tags(ours, 'tn100')).toEqual([old, next]);
		expect(await tags(ours, 'TN 2OO')).toEqual([next]);
		expect(await tags(ours, 'TN-300')).toEqual([next]);
		await replace('TN-200', 'TN-300', 'both');
		await replace('TN-100', 'TN-200', 'both');
		expect((await tags(ours, 'TN-300')).sort()).toEqual([old, next].sort());
	});

	it('tells 25 mm from one inch, and 3/4 from 19.05 mm not', async () => {
		const { ours } = await testShops();
		const crank = async (note: string) =>
			(await logOldStock(ours.ctx, { kind: 'crank', grade: 'usable', note })).tag;
		const [metric, inch, three] = [
			await crank('25 mm shaft'),
			await crank('1 in shaft'),
			await crank('3/4 shaft, keyed')
		];
		expect(await tags(ours, 'crank 25mm')).toEqual([metric]);
		expect(await tags(ours, 'one inch crank')).toEqual([inch]);
		expect(await tags(ours, '3/4 shaft crank')).toEqual([three]);
		expect(await tags(ours, 'crank 19.05 mm')).toEqual([three]);
	});

	it('reads filters off the words and a serial with doubtful characters', async () => {
		const { ours } = await testShops();
		const release = { route: 'own' as const, document: '', on: '2026-03-01' };
		const { number } = await takeIn(ours.ctx, {
			...{ maker: 'Ondrake', model: 'HX-270V', serial: '12A45-678', class: 'WB' as const },
			...{ cause: 'worn', sureness: 'seen' as const, release }
		});
		await parkDonor(ours.ctx, number, {});
		const { tag } = await pullPart(ours.ctx, number, { kind: 'coil', grade: 'usable' });
		expect(await tags(ours, '2A4?67')).toEqual([tag]);
		expect(await tags(ours, '2A4?97')).toEqual([]);
		const said = await ask(ours, { q: 'coil under 50 tested' });
		expect(said.said).toEqual([
			{ name: 'price', value: '-50' },
			{ name: 'proof', value: 'tested' }
		]);
		expect(said.total).toBe(0);
		expect(await tags(ours, 'mar 26 worn out coil')).toEqual([tag]);
		expect((await ask(ours, { q: 'stater' })).ask?.kinds.map(({ kind }) => kind)).toEqual([
			'starter12',
			'stator'
		]);
	});

	it('saves everything that answers as a CSV, of this shop alone', async () => {
		const { ours, theirs } = await testShops();
		for (let at = 0; at < 130; at++)
			await logOldStock(ours.ctx, { kind: 'coil', grade: 'usable', label: at ? '' : '=1+1' });
		await logOldStock(theirs.ctx, { kind: 'coil', grade: 'usable', label: 'theirs' });
		const reader = await ours.as('reader');
		const text = await new Response(exportParts(reader, FindQuery.parse({ q: 'coil' }))).text();
		const lines = text.trim().split('\r\n');
		expect(lines).toHaveLength(131);
		expect(new Set(lines).size).toBe(131);
		expect(text).not.toContain('theirs');
		expect(text).toContain("'=1+1");
	});

	it('keeps to what the trade ships: what each cause leaves of each kind', async () => {
		const { ours } = await testShops();
		const { rows } = await ours.ctx.db.execute<{ kind: string; letters: string; never: boolean }>(
			sql`select kind, letters, never from kind_level`
		);
		const kept = new Map(rows.map((row) => [row.kind, row]));
		expect(kept.size).toBe(kinds.length);
		for (const { id, reuse } of kinds) {
			expect(kept.get(id)?.never, id).toBe(reuse === 'never');
			const letters = CAUSES.map(
				(cause) => 'HMLX'['high medium low ruined'.split(' ').indexOf(chanceLevel(id, cause.id))]
			);
			expect(kept.get(id)?.letters.padEnd(CAUSES.length, 'X'), id).toBe(letters.join(''));
		}
	});
});
