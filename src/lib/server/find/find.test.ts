import { FindQuery } from '$lib/find/input';
import { kind } from '$lib/trade';
import { inArray } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { addBin } from '../bins';
import { inShop } from '../context';
import { testShops, type TestShop } from '../db/test-shop';
import { parkDonor, takeIn } from '../donors';
import { holdPart, logOldStock, pullPart, scrapPart, sellPart } from '../parts';
import { part } from '../parts/tables';
import { findParts } from './index';

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
