import { FindQuery } from '$lib/find/input';
import { isTag } from '$lib/codes';
import { FitNote } from '$lib/parts/fits';
import { describe, expect, it } from 'vitest';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { inShop } from '../context';
import { logOldStock, noteFit, partVerdicts } from '../parts';
import { editPolicy, getPolicyRow } from '../people';
import { putPrice } from '../prices';
import { addWant } from '../wants';
import { findParts } from './index';

const ask = (shop: TestShop, query: object) => findParts(shop.ctx, FindQuery.parse(query));
const tags = async (shop: TestShop, query: object) =>
	(await ask(shop, query)).items.map(({ tag }) => tag);

const ENGINE = 'Ondrake HX-270V';
const coil = async (shop: TestShop, more: object = {}) =>
	(await logOldStock(shop.ctx, { kind: 'coil', grade: 'good used', engine: ENGINE, ...more })).tag;
const priced = (shop: TestShop, newCents: number) =>
	putPrice(shop.ctx, {
		...{ kind: 'coil', engine: ENGINE, newCents, source: 'list', seenOn: '2026-03-01' }
	});

describe('what is kept between answers', () => {
	it('filters and sorts by what this shop asks, from the change of its policy on', async () => {
		const { ours, theirs } = await testShops();
		for (const shop of [ours, theirs]) {
			await coil(shop);
			await priced(shop, 10_000);
		}
		const [before] = (await ask(ours, { q: 'coil' })).items;
		const usual = before!.askedCents! / 100;
		const band = { q: 'coil', price: `${usual}-${usual + 1}` };
		expect((await ask(ours, band)).total).toBe(1);
		const { policy, own, version } = await getPolicyRow(ours.ctx);
		const shares = { ...policy.shares, 'good used': policy.shares['good used'] / 2 };
		await editPolicy(ours.ctx, { version, own: { ...own, shares } });
		expect((await ask(ours, band)).total).toBe(0);
		const [after] = (await ask(ours, { q: 'coil' })).items;
		expect(after!.askedCents).toBeLessThan(before!.askedCents!);
		const now = after!.askedCents! / 100;
		expect((await ask(ours, { q: 'coil', price: `${now}-${now + 1}` })).total).toBe(1);
		expect((await ask(theirs, band)).total).toBe(1);
	});

	it('says the gain that the page of a part says', async () => {
		const { ours } = await testShops();
		const tag = await coil(ours);
		await priced(ours, 6000);
		const [item] = (await ask(ours, { q: tag })).items;
		const whole = (await partVerdicts(ours.ctx, [item!.id])).get(item!.id)!;
		const { verdict, gainCents, askedCents } = whole;
		expect(item).toMatchObject({ verdict, gainCents, askedCents });
	});

	it('puts a slip right by a word that was written a moment ago', async () => {
		const { ours } = await testShops();
		await coil(ours, { note: 'brindled cover' });
		expect((await ask(ours, { q: 'brindlet' })).total).toBe(1);
		const tag = await coil(ours, { note: 'chequered lid' });
		expect(await tags(ours, { q: 'chekered' })).toEqual([tag]);
	});

	it('counts who waits in the verdicts of a list, as the page of a part does', async () => {
		const { ours, theirs } = await testShops();
		for (const shop of [ours, theirs]) await priced(shop, 6000);
		const tag = await coil(ours);
		const alone = (await ask(ours, { q: tag })).items[0]!;
		await addWant(theirs.ctx, { job: 'their job', kind: 'coil', engine: ENGINE });
		expect((await ask(ours, { q: tag })).items[0]!.gainCents).toBe(alone.gainCents);
		await addWant(ours.ctx, { job: 'the red tiller', kind: 'coil', engine: ENGINE });
		const waited = (await ask(ours, { q: tag })).items[0]!;
		const whole = (await partVerdicts(ours.ctx, [waited.id])).get(waited.id)!;
		expect(waited.verdict).toBe(whole.verdict);
		// the want is a call as well, which a list learns some minutes later
		expect(Math.abs(waited.gainCents! - whole.gainCents!)).toBeLessThan(20);
		expect(waited.gainCents).toBeGreaterThan(alone.gainCents!);
	});

	it('answers in an open transaction too, with what was written in it', async () => {
		const { ours } = await testShops();
		await inShop(ours.ctx, async (_tx, ctx) => {
			const { tag } = await logOldStock(ctx, { kind: 'coil', grade: 'usable' });
			const found = await findParts(ctx, FindQuery.parse({ q: 'coil' }));
			expect(found.items.map((item) => item.tag)).toEqual([tag]);
		});
	});
});

describe('what may be read two ways', () => {
	it('takes a tag with a slip that looks like a number for both, the number first', async () => {
		const { ours } = await testShops();
		const plain = await coil(ours);
		const typed = [...'0123456789']
			.map((digit) => plain.slice(0, -1) + digit)
			.find((slip) => slip !== plain && !isTag(slip))!;
		expect(await tags(ours, { q: typed })).toEqual([plain]);
		const numbered = await coil(ours, { numbers: [`${typed}77`] });
		expect(await tags(ours, { q: typed })).toEqual([numbered, plain]);
	});

	it('finds what was counted by the word alone', async () => {
		const { ours } = await testShops();
		const tag = await coil(ours, { note: 'pinion of 10 teeth' });
		await coil(ours, { note: 'pinion worn' });
		expect(await tags(ours, { q: 'pinion tooth' })).toEqual([tag]);
		expect(await tags(ours, { q: 'coil 10 teeth' })).toEqual([tag]);
		expect((await ask(ours, { q: 'coil 11 teeth' })).without).toEqual(['11 teeth']);
	});

	it('knows a maker as it is heard, and what does not fit, of this shop alone', async () => {
		const { ours, theirs } = await testShops();
		const tag = await coil(ours, { engine: 'Grauvik 72U' });
		await coil(ours, { engine: 'Sollane FERN-9' });
		await coil(theirs, { engine: 'Grauvik 72U' });
		expect(await tags(ours, { q: 'coil grovyk' })).toEqual([tag]);
		const note = FitNote.parse({ engine: 'Pellwyn 8HX', fits: 'yes' });
		await noteFit(ours.ctx, tag, note);
		expect(await tags(ours, { q: 'coil 8HX' })).toEqual([tag]);
		expect((await ask(theirs, { q: 'coil 8HX' })).items[0]?.reason).toBeNull();
	});
});
