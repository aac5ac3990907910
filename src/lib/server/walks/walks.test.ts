import { BinInput } from '$lib/bins/input';
import { NotFound } from '$lib/refusal';
import type { Outcome } from '$lib/walks/words';
import { beforeEach, describe, expect, it } from 'vitest';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { addBin, getBin } from '../bins';
import type { Context } from '../context';
import { fitPart, getPart, holdPart, logOldStock, missPart, movePart, undoPart } from '../parts';
import {
	allThere,
	answerStop,
	endWalk,
	findStray,
	getWalk,
	listWalks,
	putStrayRight,
	reopenWalk,
	startWalk,
	takeBackAnswer,
	walkChoices
} from '.';

let ours: TestShop;
let theirs: TestShop;
let ctx: Context;
beforeEach(async () => {
	({ ours, theirs } = await testShops());
	ctx = ours.ctx;
});

const bin = (address: string, more: Partial<BinInput> = {}) =>
	addBin(ctx, BinInput.parse({ address, size: 'm', ...more }));
const log = async (kind: string, bin?: string, engine = '') =>
	(await logOldStock(ctx, { kind, grade: 'good used', bin, engine })).tag;
const caught = (work: Promise<unknown>) => work.catch((fault: unknown) => fault);
const state = async (tag: string) => {
	const { state, bin } = await getPart(ctx, tag);
	return [state, bin];
};

/** The number of the stop of a part on a walk. */
async function stopOf(id: number, tag: string) {
	const walk = await getWalk(ctx, id);
	for (const { id: place } of walk.places) {
		const found = (await getWalk(ctx, id, place)).stops.find((stop) => stop.tag === tag);
		if (found) return found.n;
	}
	throw new Error(`${tag} is not on the walk`);
}
const say = async (id: number, tag: string, outcome: Outcome) =>
	answerStop(ctx, id, { stop: await stopOf(id, tag), outcome });

describe('a count', () => {
	it('goes bin by bin in walking order and ends with its last answer', async () => {
		await bin('K2-1');
		await bin('K1-2');
		await bin('K1-1');
		const [a, b] = [await log('recoil', 'K1-1'), await log('muffler', 'K2-1')];
		const { id } = await startWalk(ctx, { what: 'count' });
		const walk = await getWalk(ctx, id);
		expect(walk.places.map((one) => one.address)).toEqual(['K1-1', 'K1-2', 'K2-1']);
		expect(walk).toMatchObject({ total: 3, done: 0, by: 'Wenna Oke', endedAt: null });
		await say(id, a, 'found');
		const next = await getWalk(ctx, id);
		expect(next.at?.address).toBe('K1-2');
		await answerStop(ctx, id, { stop: next.stops[0]!.n, outcome: 'empty' });
		await say(id, b, 'found');
		expect((await getWalk(ctx, id)).endedAt).not.toBeNull();
		expect((await getBin(ctx, 'K1-2')).lastCounted).toEqual(ctx.now);
		expect((await listWalks(ctx)).over.map((one) => one.id)).toEqual([id]);
	});

	it('marks as missing what is not there, and a later scan finds it', async () => {
		await bin('K1-1');
		const tag = await log('recoil', 'K1-1');
		const { id } = await startWalk(ctx, { what: 'count' });
		await say(id, tag, 'not there');
		expect(await state(tag)).toEqual(['missing', 'K1-1']);
		const again = await startWalk(ours.at(new Date('2026-04-01T12:00:00Z')), { what: 'count' });
		expect((await getWalk(ctx, again.id)).stops[0]?.why).toBe('missing: look again');
		const { at } = await getWalk(ctx, again.id);
		await putStrayRight(ctx, again.id, { place: at!.id, code: tag, then: 'here' });
		expect(await state(tag)).toEqual(['shelved', 'K1-1']);
	});

	it('puts a part in the wrong bin right: it stays, or goes back', async () => {
		const { id: here } = await bin('K1-1');
		await bin('K2-1');
		const [stays, goes] = [await log('recoil', 'K2-1'), await log('cup', 'K2-1')];
		const { id } = await startWalk(ctx, { what: 'count' });
		expect(await findStray(ctx, id, here, ` ${stays.toLowerCase()} `)).toMatchObject({
			tag: stays,
			home: 'K2-1',
			notHere: null
		});
		const moved = await putStrayRight(ctx, id, { place: here, code: stays, then: 'here' });
		expect(moved.note).toBe('moved to K1-1');
		expect(await state(stays)).toEqual(['shelved', 'K1-1']);
		const back = await putStrayRight(ctx, id, { place: here, code: goes, then: 'home' });
		expect(back.note).toBe('back to K2-1');
		expect(await state(goes)).toEqual(['shelved', 'K2-1']);
		const walk = await getWalk(ctx, id);
		expect(walk.tally).toEqual([{ outcome: 'moved here', count: 2 }]);
		await takeBackAnswer(ctx, id, { stop: moved.n });
		expect(await state(stays)).toEqual(['shelved', 'K2-1']);
		expect((await getWalk(ctx, id)).done).toBe(1);
	});

	it('takes a part that turns up from no list of this walk', async () => {
		const { id: here } = await bin('K1-1');
		const { id } = await startWalk(ctx, { what: 'count' });
		const lost = await log('coil');
		const { n } = await putStrayRight(ctx, id, { place: here, code: lost, then: 'here' });
		expect(await state(lost)).toEqual(['shelved', 'K1-1']);
		expect((await getWalk(ctx, id, here)).stops).toHaveLength(2);
		await takeBackAnswer(ctx, id, { stop: n });
		expect(await state(lost)).toEqual(['pulled', null]);
		expect((await getWalk(ctx, id, here)).stops).toHaveLength(1);
	});

	it('says what a scanned code is that cannot be put right here', async () => {
		const { id: here, tag: binTag } = await bin('K1-1');
		const { id } = await startWalk(ctx, { what: 'count' });
		const out = await log('coil', 'K1-1');
		await fitPart(ctx, out, { job: 'mower' });
		const scan = (code: string) =>
			caught(putStrayRight(ctx, id, { place: here, code, then: 'here' }));
		expect(await scan(binTag)).toMatchObject({ message: expect.stringContaining('is no part') });
		expect(await scan(out)).toMatchObject({ code: 'taken' });
		expect(await scan('QQQQQ')).toMatchObject({ code: 'bad input', field: 'code' });
		const foreign = await logOldStock(theirs.ctx, { kind: 'coil', grade: 'usable' });
		expect(await scan(foreign.tag)).toMatchObject({ code: 'bad input', field: 'code' });
	});

	it('is answered for a whole bin at once, and each answer can be taken back', async () => {
		const { id: here } = await bin('K1-1');
		const tags = [await log('recoil', 'K1-1'), await log('cup', 'K1-1')];
		await missPart(ctx, tags[1]!);
		const { id } = await startWalk(ctx, { what: 'count' });
		expect(await allThere(ctx, id, { place: here })).toEqual({ count: 2 });
		expect(await state(tags[1]!)).toEqual(['shelved', 'K1-1']);
		await takeBackAnswer(ctx, id, { stop: await stopOf(id, tags[1]!) });
		expect(await state(tags[1]!)).toEqual(['missing', 'K1-1']);
		expect(await getWalk(ctx, id)).toMatchObject({ endedAt: null, done: 1 });
	});

	it('goes on on another phone; the second to answer hears what the first said', async () => {
		await bin('K1-1');
		const tag = await log('recoil', 'K1-1');
		await log('cup', 'K1-1');
		const { id } = await startWalk(ctx, { what: 'count' });
		const bench = await ours.as('bench');
		const stop = await stopOf(id, tag);
		const both = await Promise.allSettled([
			answerStop(bench, id, { stop, outcome: 'found' }),
			answerStop(ctx, id, { stop, outcome: 'not there' })
		]);
		expect(both.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
		const lost = both.find((one) => one.status === 'rejected')?.reason;
		expect(lost).toMatchObject({ code: 'taken', message: expect.stringContaining('answered') });
	});

	it('counts other bins while one still goes on, and is left and taken up again', async () => {
		for (let slot = 1; slot <= 12; slot++) await bin(`K1-${slot}`);
		const first = await startWalk(ctx, { what: 'count' });
		const second = await startWalk(ctx, { what: 'count' });
		expect((await getWalk(ctx, second.id)).places.map((one) => one.address)).toEqual([
			'K1-11',
			'K1-12'
		]);
		expect(await caught(startWalk(ctx, { what: 'count' }))).toMatchObject({ code: 'gate' });
		await endWalk(ctx, first.id);
		expect(await caught(allThere(ctx, first.id, { place: 0 }))).toMatchObject({ code: 'taken' });
		await reopenWalk(ctx, first.id);
		expect((await listWalks(ctx)).open).toHaveLength(2);
	});
});

describe('putting away', () => {
	it('leads each part to the best place for it', async () => {
		await bin('K2-1');
		await log('recoil', 'K2-1');
		await bin('R1-1', { red: true });
		const [recoil, failed] = [await log('recoil'), await log('coil')];
		const lost = await log('stator');
		await movePart(ctx, failed, { bin: 'R1-1' });
		const { id } = await startWalk(ctx, { what: 'put away' });
		expect((await getWalk(ctx, id)).places.map((one) => one.address)).toEqual(['K2-1', null]);
		await say(id, recoil, 'put away');
		expect(await state(recoil)).toEqual(['shelved', 'K2-1']);
		const stop = await stopOf(id, lost);
		expect(await caught(answerStop(ctx, id, { stop, outcome: 'put away' }))).toMatchObject({
			field: 'bin'
		});
		await bin('L3-1');
		await answerStop(ctx, id, { stop, outcome: 'put away', bin: 'l3-1' });
		expect(await state(lost)).toEqual(['shelved', 'L3-1']);
		expect(await caught(startWalk(ctx, { what: 'put away' }))).toMatchObject({
			message: 'Nothing waits to be put away.'
		});
	});
});

describe('fetching', () => {
	it('brings what is held, once, for all or for one job', async () => {
		await bin('K1-1');
		const [a, b] = [await log('recoil', 'K1-1'), await log('coil', 'K1-1')];
		await holdPart(ctx, a, { for: 'job 7' });
		await holdPart(ctx, b, { for: 'job 8' });
		expect(await walkChoices(ctx)).toMatchObject({ fetch: 2, heldFor: ['job 7', 'job 8'] });
		const { id } = await startWalk(ctx, { what: 'fetch', for: 'job 7' });
		expect((await getWalk(ctx, id)).stops.map((stop) => stop.why)).toEqual(['held for job 7']);
		await say(id, a, 'found');
		expect(await walkChoices(ctx)).toMatchObject({ fetch: 1, heldFor: ['job 8'] });
	});

	it('of one that is gone says so and lets the hold go', async () => {
		await bin('K1-1');
		const tag = await log('recoil', 'K1-1');
		await holdPart(ctx, tag, { for: 'job 7' });
		const { id } = await startWalk(ctx, { what: 'fetch' });
		await say(id, tag, 'not there');
		expect(await state(tag)).toEqual(['missing', 'K1-1']);
		await takeBackAnswer(ctx, id, { stop: 1 });
		expect(await getPart(ctx, tag)).toMatchObject({ state: 'held', heldBy: 'job 7' });
	});
});

describe('a purge', () => {
	const LATER = new Date('2028-06-01T12:00:00Z');

	it('lists copies that nobody called for in two years; scrap, price down or keep', async () => {
		await bin('K1-1');
		const same = ['', '', '', ''].map(() => log('coil', 'K1-1', 'Ondrake TARN-21L'));
		const tags: string[] = [];
		for (const one of same) tags.push(await one);
		ctx = ours.at(LATER);
		const { id } = await startWalk(ctx, { what: 'purge' });
		const walk = await getWalk(ctx, id);
		expect(walk.stops).toHaveLength(3);
		expect(walk.stops[0]?.why).toBe('no call in 24 months, 4 of the same');
		expect(walk.kilos).toMatchObject([{ scrapClass: 'Cu-M', parts: 3, grams: 1050 }]);
		const [a, b, c] = walk.stops.map((stop) => stop.tag!);
		await say(id, a!, 'scrapped');
		await say(id, b!, 'price down');
		await say(id, c!, 'kept');
		expect(await state(a!)).toEqual(['scrapped', null]);
		expect((await getPart(ctx, b!)).note).toContain('Price down');
		expect((await getWalk(ctx, id)).kilos).toMatchObject([{ parts: 1, grams: 350 }]);
		expect(await caught(startWalk(ctx, { what: 'purge' }))).toMatchObject({ code: 'gate' });
		await takeBackAnswer(ctx, id, { stop: await stopOf(id, a!) });
		expect(await state(a!)).toEqual(['shelved', 'K1-1']);
		expect(tags).toContain(a);
	});

	it('leaves alone what was called for since, and for good what is no longer made', async () => {
		await bin('K1-1');
		for (let i = 0; i < 3; i++) await log('coil', 'K1-1', 'Ondrake TARN-21L');
		for (let i = 0; i < 2; i++) await log('stator', 'K1-1', 'Ondrake TARN-21L');
		const called = await log('coil', 'K1-1', 'Ondrake TARN-21L');
		const lately = ours.at(new Date('2027-12-01T12:00:00Z'));
		await undoPart(lately, (await holdPart(lately, called, { for: 'Tamsin' })).eventId);
		ctx = ours.at(LATER);
		const { id } = await startWalk(ctx, { what: 'purge' });
		const { stops } = await getWalk(ctx, id);
		expect(stops.map((stop) => stop.kindName)).toEqual(['Stator / alternator / charging coil']);
		await say(id, stops[0]!.tag!, 'no longer made');
		ctx = ours.at(new Date('2029-06-01T12:00:00Z'));
		expect(await caught(startWalk(ctx, { what: 'purge' }))).toMatchObject({ code: 'gate' });
	});
});

it('a walk of another shop is not there, like one that never was', async () => {
	await addBin(theirs.ctx, BinInput.parse({ address: 'Z1-1', size: 's', place: 'canary' }));
	const { id } = await startWalk(theirs.ctx, { what: 'count' });
	const unknown = await caught(getWalk(ctx, 999_999));
	expect(unknown).toBeInstanceOf(NotFound);
	expect(await caught(getWalk(ctx, id))).toEqual(unknown);
	expect(await caught(answerStop(ctx, id, { stop: 1, outcome: 'empty' }))).toEqual(unknown);
	expect(await listWalks(ctx)).toEqual({ open: [], over: [] });
});
