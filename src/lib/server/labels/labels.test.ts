import { readChoice } from '$lib/labels/choice';
import { stockOf } from '$lib/labels/stocks';
import { NotFound } from '$lib/refusal';
import { beforeAll, describe, expect, it } from 'vitest';
import { bin, donorOnBench } from '../../../../tests/support/bench';
import { decode, rasterOf, wordsOf } from '../../../../tests/support/decode';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { getDonor, takeIn } from '../donors';
import { holdPart, logOldStock, pullPart, sellPart } from '../parts';
import { mintBlanks } from '../tags';
import {
	getLabelSettings,
	previewLabels,
	printLabels,
	resetStock,
	saveStock,
	sayWhose,
	toPrint
} from '.';

let ours: TestShop;
let theirs: TestShop;
let donor: string;
let part: string;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
	await bin(ours.ctx, 'K3-1');
	await bin(ours.ctx, 'K3-2');
	await bin(ours.ctx, 'RED', true);
	donor = await donorOnBench(ours.ctx, { offMachine: 'mower of Mrs Quillfeather' });
	const typed = { kind: 'carb-float', grade: 'untested' as const, bin: 'K3-1' };
	const more = { numbers: ['TN-3380'], note: 'Mrs Quillfeather rang', massGrams: 18_000 };
	part = (await pullPart(ours.ctx, donor, { ...typed, ...more })).tag;
});

const choice = (search: string) => readChoice(new URLSearchParams(search)).choice;
const codes = async (search: string) =>
	(await previewLabels(ours.ctx, choice(search), 'roll-62x29')).codes;
const caught = (work: Promise<unknown>) => work.catch((fault: unknown) => fault);

describe('what is printed', () => {
	it('says the part and never whose machine it was or who waits for it', async () => {
		const held = (await logOldStock(ours.ctx, { kind: 'coil', grade: 'good used' })).tag;
		await holdPart(ours.ctx, held, { for: 'Mr Bramblewick' });
		const asked = choice(`tag=${part},${held}&donor=${donor}`);
		for (const stock of ['roll-62x29', 'roll-4x6', 'cut-a4'] as const) {
			const said = await wordsOf(await printLabels(ours.ctx, asked, stock));
			for (const word of [part, held, 'TARN-21L', donor, 'K3-1', 'untested', 'old stock', 'Heavy'])
				expect(said, stock).toContain(word);
			expect(said).not.toMatch(/Quillfeather|Bramblewick|mower|rang/);
		}
	});

	it('carries the address of the tag in capitals, of this shop', async () => {
		const pages = await rasterOf(await printLabels(ours.ctx, choice(`tag=${part}`), 'roll-2x1'));
		expect(await decode(pages[0]!)).toEqual([
			`http://localhost:3000/t/${ours.slug}/${part}`.toUpperCase()
		]);
	});

	it('is as many as asked for, on the places that a begun sheet has left', async () => {
		const pdf = await printLabels(ours.ctx, choice(`tag=${part}&copies=4&first=12`), 'a4');
		const pages = await rasterOf(pdf);
		const read = await Promise.all(pages.map(decode));
		expect(read.map((page) => page.length)).toEqual([3, 1]);
	});

	it('is refused in words above five hundred labels, and where there is nothing', async () => {
		const { tags } = await mintBlanks(ours.ctx, { count: 30 });
		const many = choice(`tag=${tags.join('+')}&copies=20`);
		expect(await caught(printLabels(ours.ctx, many, 'a4'))).toMatchObject({ field: 'copies' });
		const none = printLabels(ours.ctx, choice('tag=00000'), 'a4');
		expect(await caught(none)).toBeInstanceOf(NotFound);
	});
});

describe('a choice', () => {
	it('is a bin, the signs of a rack, a donor with its boxes, a search, blanks', async () => {
		expect(await codes('bin=k3-1')).toEqual([part]);
		const { bins, racks } = await toPrint(ours.ctx);
		expect({ bins, racks }).toEqual({ bins: 3, racks: ['K'] });
		expect(await codes('signs=K')).toHaveLength(2);
		expect(await codes('signs=all')).toHaveLength(3);
		const { boxes } = await getDonor(ours.ctx, donor);
		expect(await codes(`donor=${donor}`)).toEqual([boxes[0]!.tag, part]);
		expect(await codes(`found=${encodeURIComponent('q=carburetor')}`)).toEqual([part]);
		const { batch, tags } = await mintBlanks(ours.ctx, { count: 3 });
		expect((await codes(`blanks=${batch}`)).toSorted()).toEqual(tags.toSorted());
		expect(await codes('blanks=unused')).toEqual(expect.arrayContaining(tags));
	});

	it('is what was logged on the day of the shop, gone parts left out', async () => {
		const { ours } = await testShops();
		const { tag: box } = await takeIn(ours.ctx, { model: 'TARN-9' });
		const sold = await logOldStock(ours.ctx, { kind: 'coil', grade: 'usable' });
		const kept = await logOldStock(ours.ctx, { kind: 'coil', grade: 'usable' });
		await sellPart(ours.ctx, sold.tag, { cents: 500 });
		const today = choice('today=yes');
		const { codes, count } = await previewLabels(ours.ctx, today, 'a4');
		expect(codes).toEqual([box, kept.tag]);
		expect(count).toEqual({ part: 1, box: 1, bin: 0, blank: 0 });
		const tomorrow = ours.at(new Date('2026-03-15T12:00:00Z'));
		expect((await previewLabels(tomorrow, today, 'a4')).codes).toEqual([]);
	});

	it('never holds a tag of another shop', async () => {
		const { tags } = await mintBlanks(theirs.ctx, { count: 1 });
		expect(await codes(`tag=${tags[0]}`)).toEqual([]);
		expect(await codes(`tag=${tags[0]},${part}`)).toEqual([part]);
		const foreign = await donorOnBench(theirs.ctx);
		const asked = previewLabels(ours.ctx, choice(`donor=${foreign.replace('D', 'D9')}`), 'a4');
		expect(await caught(asked)).toBeInstanceOf(NotFound);
	});
});

describe('settings', () => {
	it('keep the measures of the shop, and only while nobody else saved', async () => {
		const measures = { ...stockOf('a4').measures, left: 6, pitchX: 100 };
		const { version } = await getLabelSettings(ours.ctx);
		await saveStock(ours.ctx, { stock: 'a4', measures, version });
		const stale = saveStock(ours.ctx, { stock: 'letter', measures, version });
		expect(await caught(stale)).toMatchObject({ code: 'changed' });
		expect((await getLabelSettings(ours.ctx)).stocks).toEqual({ a4: measures });
		expect((await previewLabels(ours.ctx, choice(`tag=${part}`), 'a4')).measures).toEqual(measures);
		expect((await getLabelSettings(theirs.ctx)).stocks).toEqual({});
		await resetStock(ours.ctx, 'a4');
		expect((await getLabelSettings(ours.ctx)).stocks).toEqual({});
	});

	it('let only the owner say whose tags they are', async () => {
		const bench = await ours.as('bench');
		expect(await caught(sayWhose(bench, true))).toMatchObject({ code: 'role' });
		await sayWhose(ours.ctx, true);
		expect((await getLabelSettings(ours.ctx)).saysOwner).toBe(true);
		await sayWhose(ours.ctx, false);
	});
});
