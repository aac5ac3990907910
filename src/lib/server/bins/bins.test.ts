import { BinEditForm, BinForm, BinInput } from '$lib/bins/input';
import { NotFound } from '$lib/refusal';
import { beforeAll, describe, expect, it } from 'vitest';
import { inShop } from '../context';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { part } from '../parts/tables';
import { mintTag } from '../tags';
import {
	addBin,
	editBin,
	findPlace,
	getBin,
	listBins,
	listRetiredBins,
	redBin,
	retireBin,
	useBinAgain
} from '.';

let ours: TestShop;
let theirs: TestShop;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
});

const bin = (address: string, more: Partial<BinInput> = {}) =>
	BinInput.parse({ address, size: 's', ...more });

const putPart = (shop: TestShop, binId: number, state: 'shelved' | 'scrapped' = 'shelved') =>
	inShop(shop.ctx, async (tx, ctx) => {
		const tag = await mintTag(tx, ctx, 'part');
		await tx.insert(part).values({
			shopId: ctx.shopId,
			tag,
			kind: 'recoil',
			engine: 'Sollane REEF-17',
			grade: 'good used',
			state,
			scrapReason: state === 'scrapped' ? 'cracked' : null,
			binId,
			pulledAt: ctx.now,
			changedAt: ctx.now
		});
		return tag;
	});

const caught = (work: Promise<unknown>) => work.catch((fault: unknown) => fault);

describe('a bin', () => {
	it('is added with its tag, its address read into rack, shelf and slot', async () => {
		const added = await addBin(ours.ctx, bin('k3 1', { purpose: 'float carburetors', litres: 12 }));
		expect(added).toMatchObject({
			address: 'K3-1',
			rack: 'K',
			shelf: 3,
			slot: 1,
			parts: 0,
			litres: 12
		});
		expect(added.tag).toMatch(/^[0-9A-Z]{5}$/);
		expect(await getBin(ours.ctx, added.tag.toLowerCase())).toEqual(added);
	});

	it('has an address of its own', async () => {
		await addBin(ours.ctx, bin('A1-1'));
		expect(await caught(addBin(ours.ctx, bin('a-1-1')))).toMatchObject({
			code: 'taken',
			field: 'address',
			message: 'There is a bin A1-1 already. Give this one another address.'
		});
		await addBin(theirs.ctx, bin('A1-1'));
	});

	it('holds what is in it, not what has left it', async () => {
		const { id } = await addBin(ours.ctx, bin('P1-1'));
		const tag = await putPart(ours, id);
		await putPart(ours, id, 'scrapped');
		const { contents, parts } = await getBin(ours.ctx, 'P1-1');
		expect(parts).toBe(1);
		expect(contents).toMatchObject([{ tag, kind: 'recoil', engine: 'Sollane REEF-17' }]);
		expect((await listBins(ours.ctx)).find((one) => one.id === id)?.parts).toBe(1);
	});

	it('of another shop is not there, like one that never was', async () => {
		const foreign = await addBin(theirs.ctx, bin('Z9-9', { purpose: 'canary', red: true }));
		const unknown = await caught(getBin(ours.ctx, 'Z9-8'));
		expect(unknown).toBeInstanceOf(NotFound);
		expect(await caught(getBin(ours.ctx, 'Z9-9'))).toEqual(unknown);
		expect(await caught(getBin(ours.ctx, foreign.tag))).toEqual(unknown);
		expect(await caught(retireBin(ours.ctx, foreign.tag))).toEqual(unknown);
		expect(await caught(editBin(ours.ctx, foreign.tag, { ...bin('Z9-9'), version: 1 }))).toEqual(
			unknown
		);
		expect(JSON.stringify(await listBins(ours.ctx))).not.toContain('canary');
		await inShop(ours.ctx, async (tx, ctx) => {
			expect(await redBin(tx, ctx)).toBeNull();
			expect(await findPlace(tx, ctx, 'Z9-9')).toBeNull();
		});
	});
});

describe('a place', () => {
	it('is found by its address however it is written, when that means one place', async () => {
		const { ours } = await testShops();
		await addBin(ours.ctx, bin('N2-1'));
		await addBin(ours.ctx, bin('N21-3'));
		await addBin(ours.ctx, bin('N2-13'));
		for (const typed of ['n2-1', 'N 2 1', 'n21']) {
			expect((await getBin(ours.ctx, typed)).address).toBe('N2-1');
		}
		expect(await caught(getBin(ours.ctx, 'n213'))).toBeInstanceOf(NotFound);
	});
});

describe('editing', () => {
	it('from an old version is refused with both values', async () => {
		const { version } = await addBin(ours.ctx, bin('E1-1', { purpose: 'coils' }));
		await editBin(ours.ctx, 'E1-1', { ...bin('E1-1', { purpose: 'stators' }), version });
		const stale = editBin(ours.ctx, 'E1-1', { ...bin('E1-1', { purpose: 'mufflers' }), version });
		expect(await caught(stale)).toMatchObject({
			code: 'changed',
			message:
				'Somebody saved this bin meanwhile: what it is for is now “stators”, you typed “mufflers”. Look and save again.'
		});
		expect((await getBin(ours.ctx, 'E1-1')).purpose).toBe('stators');
	});

	it('to an address that is in use is refused', async () => {
		await addBin(ours.ctx, bin('E2-1'));
		const { version } = await addBin(ours.ctx, bin('E2-2'));
		const move = editBin(ours.ctx, 'E2-2', { ...bin('E2-1'), version });
		expect(await caught(move)).toMatchObject({ code: 'taken' });
	});

	it('of the cost is for the owner; the bench neither sets, sees nor loses it', async () => {
		const bench = await ours.as('bench');
		const costly = bin('E3-1', { yearlyCostCents: 250 });
		expect(await caught(addBin(bench, costly))).toMatchObject({ code: 'role' });
		const { version } = await addBin(ours.ctx, costly);
		expect((await getBin(bench, 'E3-1')).yearlyCostCents).toBeNull();
		await editBin(bench, 'E3-1', { ...bin('E3-1', { place: 'by the door' }), version });
		expect(await getBin(ours.ctx, 'E3-1')).toMatchObject({
			yearlyCostCents: 250,
			place: 'by the door'
		});
	});
});

describe('retiring', () => {
	it('is shut while parts are in it, and can be taken back', async () => {
		const { id, tag } = await addBin(ours.ctx, bin('R5-1'));
		const inside = await putPart(ours, id);
		expect(await caught(retireBin(ours.ctx, 'R5-1'))).toMatchObject({
			code: 'gate',
			message: `Move what is in R5-1 first: ${inside}.`
		});
		const empty = await addBin(ours.ctx, bin('R5-2', { red: true }));
		await inShop(ours.ctx, async (tx, ctx) =>
			expect((await redBin(tx, ctx))?.address).toBe('R5-2')
		);
		await retireBin(ours.ctx, 'R5-2');
		expect(await caught(getBin(ours.ctx, 'R5-2'))).toBeInstanceOf(NotFound);
		expect((await listRetiredBins(ours.ctx)).map((one) => one.tag)).toContain(empty.tag);
		expect(await useBinAgain(ours.ctx, empty.tag)).toEqual({ address: 'R5-2' });
		expect((await getBin(ours.ctx, tag)).parts).toBe(1);
	});

	it('frees the address, so that the old bin waits until it is free again', async () => {
		const { tag } = await addBin(ours.ctx, bin('R6-1'));
		await retireBin(ours.ctx, 'R6-1');
		await addBin(ours.ctx, bin('R6-1'));
		expect(await caught(useBinAgain(ours.ctx, tag))).toMatchObject({ code: 'taken' });
		expect(await caught(useBinAgain(theirs.ctx, tag))).toBeInstanceOf(NotFound);
	});
});

describe('the form', () => {
	it('turns decimals into cents and an empty field into nothing', () => {
		const typed = { address: 'K1-1', size: 'm', yearlyCost: '2,50', litres: '8.5' };
		expect(BinForm.parse(typed)).toMatchObject({ yearlyCostCents: 250, litres: 8.5, red: false });
		const edit = BinEditForm.parse({ address: 'K1-1', size: 'm', version: '4', red: 'yes' });
		expect(edit).toMatchObject({ yearlyCostCents: null, version: 4, red: true });
	});

	it('says in the words of its labels what to do', () => {
		const { error } = BinForm.safeParse({ size: 'huge', litres: 'a lot' });
		expect(error?.issues.map((issue) => issue.message)).toEqual([
			'Enter the address, like K3-1',
			'Choose the size',
			'Enter the litres as a number, like 12 or 12.50'
		]);
	});
});
