import { BinEdit, BinInput, RackForm, RackInput } from '$lib/bins/input';
import { beforeEach, describe, expect, it } from 'vitest';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { addBin, editBin, getBin, listBins, makeRack, retireBin } from '../bins';
import type { Context } from '../context';
import { binsFor, fitPart, getPart, logOldStock, missPart, movePart, provePart } from '../parts';
import { takeBackPart } from '../parts';
import { daysInBins, mergeBins, moneyInBins, redParts, undoBinChange } from '.';

let ours: TestShop;
let theirs: TestShop;
let ctx: Context;
beforeEach(async () => {
	({ ours, theirs } = await testShops());
	ctx = ours.ctx;
});

const bin = (address: string, more: Partial<BinInput> = {}) =>
	addBin(ctx, BinInput.parse({ address, size: 'm', ...more }));
const log = async (kind: string, bin?: string) =>
	(await logOldStock(ctx, { kind, grade: 'good used', bin })).tag;
const caught = (work: Promise<unknown>) => work.catch((fault: unknown) => fault);
const where = async (tag: string) => {
	const { state, bin } = await getPart(ctx, tag);
	return [state, bin];
};

describe('a rack', () => {
	const rack = (more: Partial<RackInput> = {}) =>
		RackInput.parse({ rack: 'q', shelves: 2, slots: 3, size: 's', ...more });

	it('is made in one go, its floor kept for heavy things; what stands there stays', async () => {
		await bin('Q1-2', { purpose: 'cranks' });
		const done = await makeRack(ctx, rack({ heavyFloor: true, loadKg: 40, uses: ['dry'] }));
		expect(done).toMatchObject({ rack: 'Q', there: 1 });
		expect(done.made).toEqual(['Q1-1', 'Q1-3', 'Q2-1', 'Q2-2', 'Q2-3']);
		expect(await getBin(ctx, 'Q1-1')).toMatchObject({ uses: ['heavy', 'dry'], loadKg: 40 });
		expect(await getBin(ctx, 'Q2-1')).toMatchObject({ uses: ['dry'] });
		expect(await getBin(ctx, 'Q1-2')).toMatchObject({ purpose: 'cranks' });
		expect(await caught(makeRack(ctx, rack()))).toMatchObject({ code: 'taken', field: 'rack' });
		expect(await listBins(theirs.ctx)).toEqual([]);
	});

	it('is taken back while nothing lies in it', async () => {
		const { eventId } = await makeRack(ctx, rack());
		const tag = await log('coil', 'Q2-3');
		expect(await caught(undoBinChange(ctx, eventId))).toMatchObject({ code: 'gate' });
		await movePart(ctx, tag, { bin: (await bin('A1-1')).tag });
		expect(await undoBinChange(theirs.ctx, eventId)).toBe(false);
		expect(await undoBinChange(ctx, eventId)).toBe(true);
		expect((await listBins(ctx)).map((one) => one.address)).toEqual(['A1-1']);
	});

	it('asks in words for what is not typed', () => {
		const { error } = RackForm.safeParse({ rack: 'K3', shelves: '0', slots: 'x', size: 's' });
		expect(error?.issues.map((issue) => issue.message)).toEqual([
			'Enter the letters of the rack, like K: letters only',
			'Enter how many shelves: 1 or more',
			'Enter how many slots'
		]);
		const large = RackForm.safeParse({ rack: 'K', shelves: '20', slots: '50', size: 's' });
		expect(large.error?.issues[0]?.message).toBe('Make 300 bins at a time or fewer');
	});
});

describe('a rename', () => {
	it('changes the address and keeps tag, parts and history; it can be taken back', async () => {
		const { tag, version } = await bin('K1-1', { uses: ['dry'], kinds: ['coil'] });
		const part = await log('coil', 'K1-1');
		await editBin(ctx, tag, BinEdit.parse({ address: 'M4-2', size: 'm', version }));
		const renamed = await getBin(ctx, 'm42');
		expect(renamed).toMatchObject({ tag, rack: 'M', uses: ['dry'], kinds: ['coil'], parts: 1 });
		expect(renamed.history.map((one) => one.said)).toEqual(['Renamed from K1-1 to M4-2', 'Added']);
		expect(await where(part)).toEqual(['shelved', 'M4-2']);
		await undoBinChange(ctx, renamed.history[0]!.id);
		expect(await getBin(ctx, tag)).toMatchObject({ address: 'K1-1', rack: 'K', shelf: 1 });
	});

	it('is not taken back over what was done since', async () => {
		const { tag } = await bin('K1-1');
		const { eventId } = await retireBin(ctx, tag);
		await undoBinChange(ctx, eventId);
		expect(await caught(undoBinChange(ctx, eventId))).toMatchObject({ code: 'changed' });
	});
});

describe('merging', () => {
	it('moves every part with its own event, also a missing one, and can be taken back', async () => {
		await bin('K1-1');
		await bin('K1-2');
		const [a, lost] = [await log('coil', 'K1-1'), await log('recoil', 'K1-1')];
		await missPart(ctx, lost);
		const { moved, eventId } = await mergeBins(ctx, 'K1-1', { into: 'k1-2' });
		expect(moved).toBe(2);
		expect(await where(a)).toEqual(['shelved', 'K1-2']);
		expect(await where(lost)).toEqual(['missing', 'K1-2']);
		expect((await getPart(ctx, a)).history[0]?.said).toBe('Moved to K1-2');
		expect(await caught(getBin(ctx, 'K1-1'))).toMatchObject({ name: 'NotFound' });
		await undoBinChange(ctx, eventId);
		expect(await where(a)).toEqual(['shelved', 'K1-1']);
		expect(await where(lost)).toEqual(['missing', 'K1-1']);
	});

	it('is taken back whole or not at all', async () => {
		await bin('K1-1');
		await bin('K1-2');
		const [a, b] = [await log('coil', 'K1-1'), await log('coil', 'K1-1')];
		const { eventId } = await mergeBins(ctx, 'K1-1', { into: 'K1-2' });
		await fitPart(ctx, b, { job: 'mower' });
		expect(await caught(undoBinChange(ctx, eventId))).toMatchObject({ code: 'changed' });
		expect(await where(a)).toEqual(['shelved', 'K1-2']);
	});

	it('is refused into itself, into nothing, and between red and other bins', async () => {
		await bin('K1-1');
		await bin('R1-1', { red: true });
		const merge = (into: string) => caught(mergeBins(ctx, 'K1-1', { into }));
		expect(await merge('K1-1')).toMatchObject({ field: 'into' });
		expect(await merge('K9-9')).toMatchObject({ message: expect.stringContaining('K9-9') });
		expect(await merge('R1-1')).toMatchObject({ code: 'gate' });
		await addBin(theirs.ctx, BinInput.parse({ address: 'Z1-1', size: 's' }));
		expect(await merge('Z1-1')).toMatchObject({ field: 'into' });
	});

	it('of the same two bins both ways at once leaves one', async () => {
		await bin('K1-1');
		await bin('K1-2');
		const both = await Promise.allSettled([
			mergeBins(ctx, 'K1-1', { into: 'K1-2' }),
			mergeBins(ctx, 'K1-2', { into: 'K1-1' })
		]);
		expect(both.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
		expect(await listBins(ctx)).toHaveLength(1);
	});
});

describe('room', () => {
	it('is counted from what lies there, and what is wrong is said', async () => {
		await bin('K1-1', { litres: 3, loadKg: 1 });
		await logOldStock(ctx, { kind: 'coil', grade: 'usable', massGrams: 900, bin: 'K1-1' });
		const lost = await log('coil', 'K1-1');
		expect((await getBin(ctx, 'K1-1')).room).toMatchObject({ litres: 3, grams: 1250, fullness: 1 });
		expect((await getBin(ctx, 'K1-1')).room.flags.map((one) => one.said)).toEqual([
			'too heavy',
			'full'
		]);
		await missPart(ctx, lost);
		expect((await getBin(ctx, 'K1-1')).room).toMatchObject({ grams: 900, flags: [] });
	});

	it('decides where the next of a kind is best put', async () => {
		await bin('K1-1', { litres: 3 });
		await bin('K1-2', { kinds: ['coil'] });
		await log('coil', 'K1-1');
		expect((await binsFor(ctx, 'coil')).map((one) => one.address)).toEqual(['K1-1', 'K1-2']);
		await log('coil', 'K1-1');
		expect(await binsFor(ctx, 'coil')).toMatchObject([
			{ address: 'K1-2', why: 'named for it, room for 26', parts: 0 }
		]);
		expect(await binsFor(theirs.ctx, 'coil')).toEqual([]);
	});

	it('is worth what is asked, and as old as its parts in the middle', async () => {
		const { id } = await bin('K1-1');
		await log('coil', 'K1-1');
		const later = ours.at(new Date(ctx.now.getTime() + 10 * 24 * 3600 * 1000));
		expect((await daysInBins(later)).get(id)).toBe(10);
		expect((await moneyInBins(ctx)).get(id)).toBe(0);
		expect((await daysInBins(theirs.ctx)).size).toBe(0);
	});
});

describe('the red bin', () => {
	it('shows what lies there, why and what to do next; out only by a passed test', async () => {
		await bin('K1-1');
		await bin('R1-1', { red: true });
		const [back, failed] = [await log('coil', 'K1-1'), await log('carb-float', 'K1-1')];
		await fitPart(ctx, back, { job: 'mower' });
		await takeBackPart(ctx, back, { reason: 'no spark hot' });
		await provePart(ctx, failed, { how: 'bench test cold', passed: false });
		const red = await redParts(ctx);
		expect(red.map((one) => [one.item.tag, one.item.bin, one.next])).toEqual([
			[back, 'R1-1', 'test'],
			[failed, 'R1-1', 'rebuild']
		]);
		expect(red[0]).toMatchObject({ because: 'Came back: no spark hot', by: 'Wenna Oke' });
		expect(await caught(movePart(ctx, back, { bin: 'K1-1' }))).toMatchObject({
			code: 'gate',
			field: 'bin',
			message: 'It failed or came back. It goes to the red bin until a test is passed.'
		});
		await provePart(ctx, back, { how: 'look-over', passed: true });
		expect(await caught(movePart(ctx, back, { bin: 'K1-1' }))).toMatchObject({ code: 'gate' });
		await provePart(ctx, back, { how: 'bench test hot', passed: true });
		await movePart(ctx, back, { bin: 'K1-1' });
		expect((await redParts(ctx)).map((one) => one.item.tag)).toEqual([failed]);
		expect(await redParts(theirs.ctx)).toEqual([]);
	});

	it('wants the test after the part got there, not before', async () => {
		await bin('K1-1');
		await bin('R1-1', { red: true });
		const tag = await log('coil', 'K1-1');
		await provePart(ctx, tag, { how: 'bench test hot', passed: true });
		await movePart(ctx, tag, { bin: 'R1-1' });
		expect(await caught(movePart(ctx, tag, { bin: 'K1-1' }))).toMatchObject({ code: 'gate' });
	});
});
