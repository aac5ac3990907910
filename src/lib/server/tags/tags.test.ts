import { sql } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { BinInput } from '$lib/bins/input';
import { donorOnBench } from '../../../../tests/support/bench';
import { NOON, testShops, type TestShop } from '../../../../tests/support/shops';
import { addBin } from '../bins';
import { inShop } from '../context';
import { addBox, getDonor, takeIn } from '../donors';
import { sayWhose } from '../labels';
import { getPart, logOldStock, pullPart } from '../parts';
import { findTag, listBlanks, mintBlanks, strangerWaits, tagOwner } from '.';

let ours: TestShop;
let theirs: TestShop;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
});

const caught = (work: Promise<unknown>) => work.catch((fault: unknown) => fault);
const blank = async (shop = ours) => (await mintBlanks(shop.ctx, { count: 1 })).tags[0]!;
const coil = { kind: 'coil', grade: 'usable' as const };
const bin = (address: string, tag: string) =>
	addBin(ours.ctx, BinInput.parse({ address, size: 's', tag }));

describe('a blank tag', () => {
	it('is made in advance and hangs on nothing', async () => {
		const { tags, batch } = await mintBlanks(ours.ctx, { count: 5 });
		expect(new Set(tags).size).toBe(5);
		for (const tag of tags) expect(await findTag(ours.ctx, tag)).toMatchObject({ what: 'blank' });
		expect((await listBlanks(ours.ctx, batch)).toSorted()).toEqual(tags.toSorted());
		expect(await listBlanks(theirs.ctx)).toEqual([]);
		expect(await caught(listBlanks(theirs.ctx, batch))).toMatchObject({ name: 'NotFound' });
	});

	it('is given to a new donor, another box, a part just pulled, old stock or a bin', async () => {
		const [one, two, three, four, five] = (await mintBlanks(ours.ctx, { count: 5 })).tags;
		const taken = await takeIn(ours.ctx, { model: 'TARN-21L', tag: one!.toLowerCase() });
		expect(taken.tag).toBe(one);
		await addBox(ours.ctx, taken.number, two);
		const { boxes } = await getDonor(ours.ctx, two!);
		expect(boxes.map((box) => box.tag)).toEqual([one, two]);
		const donor = await donorOnBench(ours.ctx);
		expect((await pullPart(ours.ctx, donor, { ...coil, tag: three })).tag).toBe(three);
		await logOldStock(ours.ctx, { ...coil, tag: four });
		expect(await getPart(ours.ctx, four!)).toMatchObject({ kind: 'coil', donor: null });
		expect((await bin('K1-1', five!)).tag).toBe(five);
		const what = await Promise.all(
			[one, two, three, four, five].map((tag) => findTag(ours.ctx, tag!))
		);
		expect(what.map((found) => found?.what)).toEqual(['box', 'box', 'part', 'part', 'bin']);
	});

	it('is given once, also when two claim it at the same time', async () => {
		const tag = await blank();
		const claims = [1, 2, 3, 4].map(() => caught(logOldStock(ours.ctx, { ...coil, tag })));
		const answers = await Promise.all(claims);
		expect(answers.filter((answer) => !(answer instanceof Error))).toHaveLength(1);
		expect(answers.find((answer) => answer instanceof Error)).toMatchObject({
			code: 'taken',
			field: 'tag',
			message: `${tag} is on a part already. Take another blank tag.`
		});
	});

	it('stays blank when its thing was not made', async () => {
		const tag = await blank();
		await bin('K1-2', await blank());
		expect(await caught(bin('K1-2', tag))).toMatchObject({ code: 'taken', field: 'address' });
		expect(await findTag(ours.ctx, tag)).toMatchObject({ what: 'blank' });
	});

	it('of another shop is as one that never was', async () => {
		const foreign = await blank(theirs);
		const asked = await caught(logOldStock(ours.ctx, { ...coil, tag: foreign }));
		const unknown = await caught(logOldStock(ours.ctx, { ...coil, tag: '0000A' }));
		expect(`${asked}`.replace(foreign, 'X')).toBe(`${unknown}`.replace('0000A', 'X'));
		expect(await findTag(theirs.ctx, foreign)).toMatchObject({ what: 'blank' });
	});

	it('is not made without end', async () => {
		expect(await caught(mintBlanks(ours.ctx, { count: 201 }))).toMatchObject({ code: 'gate' });
		expect(await caught(mintBlanks(await ours.as('reader'), { count: 1 }))).toMatchObject({
			code: 'role'
		});
	});

	it('cannot be taken from its thing again, by any query', async () => {
		const { tag } = await logOldStock(ours.ctx, coil);
		const free = await blank();
		for (const change of [
			sql`update tag set what = 'blank' where code = ${tag}`,
			sql`update tag set what = 'bin' where code = ${tag}`,
			sql`update tag set code = '0000A' where code = ${free}`,
			sql`delete from tag where code = ${free}`
		])
			await expect(inShop(ours.ctx, (tx) => tx.execute(change))).rejects.toMatchObject({
				cause: { code: '42501' }
			});
	});
});

describe('a stranger who scans', () => {
	it('learns whose tag it is only where the shop wants it, and of no tag that is not there', async () => {
		const { ours } = await testShops();
		const tag = await blank(ours);
		const asks = (slug: string, code: string) => tagOwner(ours.ctx.db, slug, code);
		expect(await asks(ours.slug, tag)).toBeNull();
		await sayWhose(ours.ctx, true);
		expect(await asks(ours.slug, tag.toLowerCase())).toBe('Ours');
		expect(await asks(ours.slug, '0000A')).toBeNull();
		expect(await asks(theirs.slug, tag)).toBeNull();
		expect(await asks('no-such-shop', tag)).toBeNull();
		await sayWhose(ours.ctx, false);
		expect(await asks(ours.slug, tag)).toBeNull();
	});

	it('waits after thirty scans in a minute; others do not, nor does he later', async () => {
		const { db } = ours.ctx;
		const scan = (from: string, at = NOON) => strangerWaits(db, from, at);
		const waits = [];
		for (let count = 0; count < 31; count += 1) waits.push(await scan('192.0.2.7'));
		expect(waits.slice(0, 30)).toEqual(Array(30).fill(0));
		expect(waits[30]).toBe(60);
		expect(await scan('192.0.2.8')).toBe(0);
		expect(await scan('192.0.2.7', new Date(NOON.getTime() + 60_001))).toBe(0);
	});
});
