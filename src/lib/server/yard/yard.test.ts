import { beforeEach, describe, expect, it } from 'vitest';
import { bin, donorOnBench } from '../../../../tests/support/bench';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { ReleaseInput } from '$lib/donors/input';
import { NotFound } from '$lib/refusal';
import { Finish, ScrapRun, WasteEntry } from '$lib/yard/input';
import { editDonor, getDonor, releaseDonor, takeIn } from '../donors';
import { fitPart, hangPhoto, pullPart, scrapPart, sellPart, undoPart } from '../parts';
import { putPrice } from '../prices';
import {
	addScrapRun,
	addWaste,
	correctWaste,
	finishStripping,
	getFinish,
	getScrapRun,
	listRegister,
	listScrapRuns,
	listWaste,
	readyForScrap,
	takeBackScrapRun
} from '.';

let ours: TestShop, theirs: TestShop;
const caught = (work: Promise<unknown>) => work.catch((fault: unknown) => fault);
const finish = Finish.parse({ grams: 9300, scrapClass: 'Al-C', drained: ['oil', 'fuel'] });
const run = (donors: string[]) =>
	ScrapRun.parse({
		...{ buyer: 'Harbour Metals', ticket: 'W-118', donors },
		loads: [{ scrapClass: 'Al-C', grams: 9100, cents: 820 }]
	});

beforeEach(async () => {
	({ ours, theirs } = await testShops());
});

describe('the end of stripping', () => {
	it('shows what is left, a carcass by its class less what came off, and the account', async () => {
		const donor = await donorOnBench(ours.ctx, { paidCents: 3000 });
		await bin(ours.ctx, 'K3-1');
		const price = { kind: 'recoil', newCents: 6000, source: 'list', seenOn: '2026-03-01' };
		await putPrice(ours.ctx, { ...price, engine: 'Ondrake TARN-21L' });
		const before = await getFinish(ours.ctx, donor);
		const part = { kind: 'recoil', grade: 'good used', bin: 'K3-1', massGrams: 900 } as const;
		const { tag } = await pullPart(ours.ctx, donor, part);
		const after = await getFinish(ours.ctx, donor);
		expect(before.left.map(({ kind }) => kind)).toContain('recoil');
		expect(after.left.map(({ kind }) => kind)).not.toContain('recoil');
		expect(before.grams - after.grams).toBe(900);
		expect(after.account).toMatchObject({ paidCents: 3000, onShelf: 1, sold: 0, lossCents: 0 });
		const { askedCents, carriedCents, scrapCents } = after.account!;
		expect(carriedCents).toBe(Math.min(askedCents, Math.max(0, 3000 - scrapCents)));
		await sellPart(ours.ctx, tag, { cents: 2500 });
		const { account } = await getFinish(ours.ctx, donor);
		expect(account).toMatchObject({ broughtCents: 2500, sold: 1, onShelf: 0, carriedCents: 0 });
		expect((await getFinish(await ours.as('bench'), donor)).account).toBeNull();
	});

	it('waits for the picture of a safety part that was destroyed', async () => {
		const donor = await donorOnBench(ours.ctx);
		const scrapped = { reason: 'cracked', destroyed: true };
		const { tag } = await pullPart(ours.ctx, donor, { kind: 'flywheel', scrapped });
		expect(String(await caught(finishStripping(ours.ctx, donor, finish)))).toMatch(
			/Photograph Flywheel/
		);
		await hangPhoto(ours.ctx, tag, {
			key: `1/${crypto.randomUUID()}`,
			width: 1,
			height: 1,
			bytes: 1,
			blur: ''
		});
		await finishStripping(ours.ctx, donor, finish);
	});

	it('keeps the carcass as it was weighed', async () => {
		const donor = await donorOnBench(ours.ctx);
		await finishStripping(await ours.as('bench'), donor, finish);
		expect((await getDonor(ours.ctx, donor)).state).toBe('stripped');
		expect(await getFinish(ours.ctx, donor)).toMatchObject({ ...finish, grams: 9300 });
		expect(await caught(finishStripping(ours.ctx, donor, finish))).toMatchObject({ code: 'gate' });
	});
});

describe('a scrap run', () => {
	it('closes its donors, and taken back it opens them and stays to be read', async () => {
		const donor = await donorOnBench(ours.ctx);
		expect(String(await caught(addScrapRun(ours.ctx, run([donor]))))).toMatch(/on the bench/);
		await finishStripping(ours.ctx, donor, finish);
		expect(await readyForScrap(ours.ctx)).toMatchObject([
			{ number: donor, grams: 9300, shut: null }
		]);
		const { number } = await addScrapRun(ours.ctx, run([donor, donor]));
		expect(number).toBe(1);
		expect((await getDonor(ours.ctx, donor)).state).toBe('gone');
		expect(await readyForScrap(ours.ctx)).toEqual([]);
		expect(await getScrapRun(ours.ctx, 1)).toMatchObject({
			...{ buyer: 'Harbour Metals', ticket: 'W-118', grams: 9100, cents: 820, donors: [donor] },
			loads: [{ said: 'clean cast aluminium', grams: 9100 }]
		});
		await takeBackScrapRun(ours.ctx, 1, { reason: 'wrong ticket' });
		expect((await getDonor(ours.ctx, donor)).state).toBe('stripped');
		expect(await caught(takeBackScrapRun(ours.ctx, 1, { reason: 'again' }))).toMatchObject({
			code: 'gate'
		});
		const { items } = await listScrapRuns(ours.ctx);
		expect(items).toMatchObject([{ number: 1, takenBack: { because: 'wrong ticket' } }]);
		expect((await addScrapRun(ours.ctx, run([donor]))).number).toBe(2);
	});

	it('leaves nothing behind where one of its donors may not go', async () => {
		const one = await donorOnBench(ours.ctx);
		const two = await donorOnBench(ours.ctx);
		for (const donor of [one, two]) await finishStripping(ours.ctx, donor, finish);
		await releaseDonor(
			ours.ctx,
			two,
			ReleaseInput.parse({ route: 'bought', holdUntil: '2099-01-01' })
		);
		expect((await readyForScrap(ours.ctx)).map(({ shut }) => shut !== null)).toEqual([false, true]);
		expect(String(await caught(addScrapRun(ours.ctx, run([one, two]))))).toMatch(/Hold date/);
		expect((await getDonor(ours.ctx, one)).state).toBe('stripped');
		expect((await listScrapRuns(ours.ctx)).items).toEqual([]);
	});

	it('of another shop is not there', async () => {
		const donor = await donorOnBench(theirs.ctx);
		await finishStripping(theirs.ctx, donor, finish);
		await addScrapRun(theirs.ctx, run([donor]));
		expect(await caught(getScrapRun(ours.ctx, 1))).toBeInstanceOf(NotFound);
		expect((await listScrapRuns(ours.ctx)).items).toEqual([]);
		expect(await readyForScrap(ours.ctx)).toEqual([]);
	});
});

describe('before the hold date', () => {
	it('nothing off a donor is sold, fitted or scrapped; the day it is past, all of it may', async () => {
		const donor = await donorOnBench(ours.ctx);
		await bin(ours.ctx, 'K3-1');
		const part = { kind: 'recoil', grade: 'good used', bin: 'K3-1' } as const;
		const { tag } = await pullPart(ours.ctx, donor, part);
		await releaseDonor(
			ours.ctx,
			donor,
			ReleaseInput.parse({ route: 'bought', holdUntil: '2026-03-20' })
		);
		const verbs = [
			(ctx: typeof ours.ctx) => sellPart(ctx, tag, { cents: 1500 }),
			(ctx: typeof ours.ctx) => fitPart(ctx, tag, { job: 'Tiller' }),
			(ctx: typeof ours.ctx) => scrapPart(ctx, tag, { reason: 'cracked' })
		];
		for (const verb of verbs)
			expect(String(await caught(verb(ours.ctx)))).toMatch(/Hold date is 20 March/);
		const later = ours.at(new Date('2026-03-20T18:00:00Z'));
		for (const verb of verbs) await undoPart(later, (await verb(later)).eventId);
	});
});

describe('used oil and old fuel', () => {
	const can = (way: 'in' | 'out', millilitres: number, who = '') =>
		WasteEntry.parse({ what: 'used oil', way, millilitres, who });

	it('is what went in less what was taken away; a wrong entry stays, put right', async () => {
		await addWaste(ours.ctx, can('in', 1500));
		const { id } = await addWaste(ours.ctx, can('in', 90_000));
		await addWaste(ours.ctx, can('out', 1000, 'Harbour Oils'));
		await correctWaste(ours.ctx, id);
		const { items, standing } = await listWaste(ours.ctx);
		expect(standing).toEqual([{ what: 'used oil', millilitres: 500 }]);
		expect(items).toHaveLength(4);
		expect(items.find((one) => one.id === id)?.corrected).toBe(true);
		expect(await caught(correctWaste(ours.ctx, id))).toMatchObject({ code: 'gate' });
		expect(await caught(correctWaste(theirs.ctx, id))).toBeInstanceOf(NotFound);
		expect((await listWaste(theirs.ctx)).items).toEqual([]);
	});

	it('is not taken away by nobody, nor tomorrow', async () => {
		expect(await caught(addWaste(ours.ctx, can('out', 100)))).toMatchObject({ field: 'who' });
		const early = { ...can('in', 100), on: '2099-01-01' };
		expect(await caught(addWaste(ours.ctx, early))).toMatchObject({ field: 'on' });
	});
});

describe('the register', () => {
	it('runs on without gaps in each shop, keeps what was replaced, and is found by a piece of a serial', async () => {
		const release = ReleaseInput.parse({ route: 'bought', fromName: 'T. Aske', idSeen: 'licence' });
		const { number } = await takeIn(ours.ctx, { model: 'TARN-21L', serial: 'OR-88I4' });
		const other = await takeIn(ours.ctx, { model: 'REEF-17', serial: '77' });
		await releaseDonor(ours.ctx, number, release);
		await releaseDonor(ours.ctx, other.number, release);
		await releaseDonor(ours.ctx, number, { ...release, because: 'the name was wrong' });
		await caught(releaseDonor(ours.ctx, number, { ...release, on: '2099-01-01' }));
		await releaseDonor(ours.ctx, other.number, release);
		const { items } = await listRegister(ours.ctx);
		expect(items.map((one) => one.number)).toEqual([4, 3, 2, 1]);
		expect(items.map((one) => one.replaced)).toEqual([false, false, true, true]);
		for (const q of ['8814', 'or 88i', number, '88?4']) {
			const found = (await listRegister(ours.ctx, { q })).items;
			expect(found.map((one) => one.number)).toEqual([3, 1]);
		}
		expect(items.find((one) => one.number === 3)).toMatchObject({
			...{ donor: number, fromName: 'T. Aske', because: 'the name was wrong' }
		});
		await editDonor(ours.ctx, number, { serial: 'X-9' });
		for (const q of ['x9', '8814']) {
			const book = (await listRegister(ours.ctx, { q })).items;
			expect(book.map((one) => one.serial)).toEqual(['OR-88I4', 'OR-88I4']);
		}
		expect((await listRegister(ours.ctx, { from: '2026-03-15' })).items).toEqual([]);
		expect((await listRegister(theirs.ctx)).items).toEqual([]);
	});
});
