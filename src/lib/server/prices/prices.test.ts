import type { PriceInput } from '$lib/prices/input';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { event } from '../people/tables';
import {
	editPrice,
	findPrice,
	getPrice,
	listPrices,
	listRemoved,
	pricedEngines,
	pricesFor,
	putBackPrice,
	putPrice,
	removePrice
} from '.';
import { price } from './tables';

let ours: TestShop, theirs: TestShop;

beforeAll(async () => {
	({ ours, theirs } = await testShops());
});

beforeEach(async () => {
	await inShop(ours.ctx, (tx) => tx.delete(price).where(eq(price.shopId, ours.ctx.shopId)));
});

const input = (over: Partial<PriceInput> = {}): PriceInput => ({
	kind: 'coil',
	engine: 'Ondrake TARN-21L',
	newCents: 4400,
	copyCents: 1800,
	source: 'Counter book',
	seenOn: '2026-03-03',
	...over
});

const happenings = (ctx: Context, id: number) =>
	inShop(ctx, async (tx) => {
		const rows = await tx
			.select({ what: event.what })
			.from(event)
			.where(and(eq(event.shopId, ctx.shopId), eq(event.about, 'price'), eq(event.aboutId, id)))
			.orderBy(event.id);
		return rows.map(({ what }) => what);
	});

describe('the price list', () => {
	it('holds one price for a kind on an engine, however it is written', async () => {
		const first = await putPrice(ours.ctx, input());
		const again = await putPrice(
			ours.ctx,
			input({ engine: 'ondrake tarn 21l', newCents: 4600, copyCents: null })
		);
		expect(again).toMatchObject({ id: first.id, newCents: 4600, copyCents: null, version: 2 });
		expect((await listPrices(ours.ctx)).total).toBe(1);
		expect(await happenings(ours.ctx, first.id)).toEqual(['added', 'changed']);
	});

	it('two who put the same price at once leave one', async () => {
		await Promise.all(
			Array.from({ length: 8 }, (_, at) => putPrice(ours.ctx, input({ newCents: 4000 + at })))
		);
		const { items } = await listPrices(ours.ctx);
		expect(items).toHaveLength(1);
		expect(items[0]!.version).toBe(8);
	});

	it('says both values when somebody saved in between', async () => {
		const { id, version } = await putPrice(ours.ctx, input());
		await editPrice(ours.ctx, id, input({ newCents: 5000, version }));
		await expect(editPrice(ours.ctx, id, input({ newCents: 6000, version }))).rejects.toMatchObject(
			{
				code: 'changed',
				message: expect.stringMatching(/now \$50\.00 new.*typed \$60\.00 new/)
			}
		);
		await expect(putPrice(ours.ctx, input({ newCents: 6000, version }))).rejects.toMatchObject({
			code: 'changed'
		});
		expect((await getPrice(ours.ctx, id)).newCents).toBe(5000);
	});

	it('an edit may change what the price is for, not onto another price', async () => {
		const { id } = await putPrice(ours.ctx, input());
		await putPrice(ours.ctx, input({ engine: undefined, number: 'AB-12' }));
		await expect(
			editPrice(ours.ctx, id, input({ engine: undefined, number: 'ab12' }))
		).rejects.toMatchObject({ code: 'taken' });
		expect(await editPrice(ours.ctx, id, input({ kind: 'stator' }))).toMatchObject({
			id,
			kind: 'stator'
		});
	});

	it('finds the very one for a kind, engine and number', async () => {
		const { id } = await putPrice(ours.ctx, input());
		const what = { kind: 'coil', engine: 'ONDRAKE tarn 21L', number: '' };
		expect((await findPrice(ours.ctx, what))?.id).toBe(id);
		expect(await findPrice(ours.ctx, { ...what, number: 'N1' })).toBeNull();
		expect(await findPrice(theirs.ctx, what)).toBeNull();
	});

	it('refuses a day that lies ahead', async () => {
		await expect(putPrice(ours.ctx, input({ seenOn: '2026-03-20' }))).rejects.toMatchObject({
			code: 'bad input',
			field: 'seenOn'
		});
	});

	it('removed can be put back as it was, once, for 30 days', async () => {
		const { id, version } = await putPrice(ours.ctx, input());
		await expect(removePrice(ours.ctx, id, version + 1)).rejects.toMatchObject({ code: 'changed' });
		const gone = await removePrice(ours.ctx, id, version);
		await expect(getPrice(ours.ctx, id)).rejects.toThrow('not on the list');
		expect(await listRemoved(ours.ctx)).toMatchObject([
			{ event: gone, newCents: 4400, by: 'Wenna Oke' }
		]);
		const late = ours.at(new Date(ours.ctx.now.getTime() + 31 * 86_400_000));
		await expect(putBackPrice(late, gone)).rejects.toThrow('any more');
		expect(await putBackPrice(ours.ctx, gone)).toMatchObject({
			id,
			newCents: 4400,
			source: 'Counter book'
		});
		expect(await listRemoved(ours.ctx)).toEqual([]);
		await expect(putBackPrice(ours.ctx, gone)).rejects.toMatchObject({ code: 'taken' });
		expect(await happenings(ours.ctx, id)).toEqual(['added', 'removed', 'put back']);
	});

	it('is found by kind name, misspelt too, by engine, number and source', async () => {
		await putPrice(ours.ctx, input());
		await putPrice(
			ours.ctx,
			input({ kind: 'carb-float', number: '12 345-B', source: 'Quote 100%' })
		);
		const kinds = async (q: string) =>
			(await listPrices(ours.ctx, { q })).items.map(({ kind }) => kind);
		expect(await kinds('carburator')).toEqual(['carb-float']);
		expect(await kinds('12345b')).toEqual(['carb-float']);
		expect(await kinds('tarn 21')).toHaveLength(2);
		expect(await kinds('100%')).toEqual(['carb-float']);
		expect(await kinds('nothing of the sort')).toEqual([]);
		expect(await pricedEngines(ours.ctx)).toEqual(['Ondrake TARN-21L']);
	});

	it('marks and filters old prices by the limit of the policy', async () => {
		await putPrice(ours.ctx, input({ seenOn: '2025-09-14' }));
		await putPrice(ours.ctx, input({ kind: 'stator', seenOn: '2025-09-15' }));
		const { items } = await listPrices(ours.ctx, { stale: true });
		expect(items.map(({ kind, stale }) => [kind, stale])).toEqual([['coil', true]]);
		expect((await listPrices(ours.ctx, { kind: 'stator' })).items[0]!.stale).toBe(false);
	});

	it.each(['kind', 'engine', 'number', 'new', 'copy', 'seen'] as const)(
		'by %s pages without a gap or a double, both ways',
		async (sort) => {
			const kinds = ['coil', 'stator', 'recoil', 'muffler', 'cam', 'crank', 'head'];
			for (const [at, kind] of kinds.entries())
				await putPrice(
					ours.ctx,
					input({
						kind,
						number: at % 2 ? `N${at}` : undefined,
						copyCents: at % 3 ? 900 : null,
						newCents: 1000 + (at % 4) * 500,
						seenOn: `2026-03-0${1 + (at % 3)}`
					})
				);
			for (const down of [false, true]) {
				const seen: string[] = [];
				for (let cursor: string | null | undefined; cursor !== null;) {
					const list = await listPrices(ours.ctx, { sort, down, limit: 2, cursor });
					seen.push(...list.items.map(({ kind }) => kind));
					cursor = list.next;
				}
				expect(seen).toHaveLength(kinds.length);
				expect(new Set(seen).size).toBe(kinds.length);
				const whole = (await listPrices(ours.ctx, { sort, down })).items.map(({ kind }) => kind);
				expect(seen).toEqual(whole);
			}
		}
	);

	it('refuses a cursor that it did not give out', async () => {
		await expect(listPrices(ours.ctx, { cursor: 'x' })).rejects.toMatchObject({
			code: 'bad input',
			field: 'cursor'
		});
	});
});

describe('the price that counts', () => {
	const ask = { key: 'it', kind: 'coil', engineKey: 'ondraketarn21l', numberKeys: ['AB12'] };
	const counts = (asked: Partial<typeof ask> = {}, ctx = ours.ctx) =>
		inShop(
			ctx,
			async (tx, ctx) => (await pricesFor(tx, ctx, [{ ...ask, ...asked }])).get('it')?.newCents
		);

	it('is that of the part number, then of the kind on the engine, then none', async () => {
		await putPrice(ours.ctx, input({ newCents: 4400 }));
		expect(await counts()).toBe(4400);
		await putPrice(ours.ctx, input({ engine: undefined, number: 'ab-12', newCents: 5500 }));
		expect(await counts()).toBe(5500);
		expect(await counts({ numberKeys: [] })).toBe(4400);
		expect(await counts({ numberKeys: [], kind: 'stator' })).toBeUndefined();
		expect(await counts({ numberKeys: [], engineKey: '' })).toBeUndefined();
	});

	it('of a kind on an engine without a number goes before one with another number', async () => {
		await putPrice(ours.ctx, input({ number: 'ZZ-9', newCents: 7000 }));
		expect(await counts()).toBe(7000);
		await putPrice(ours.ctx, input({ newCents: 4400, seenOn: '2026-01-01' }));
		expect(await counts()).toBe(4400);
	});
});

describe('another shop', () => {
	it('sees nothing of it, and a foreign price is as one that is not there', async () => {
		const { id, version } = await putPrice(ours.ctx, input());
		const gone = await removePrice(ours.ctx, id, version);
		const here = await putPrice(ours.ctx, input({ source: 'canary' }));
		expect((await listPrices(theirs.ctx)).items).toEqual([]);
		expect(await pricedEngines(theirs.ctx)).toEqual([]);
		expect(await listRemoved(theirs.ctx)).toEqual([]);
		const ask = [{ key: 'it', kind: 'coil', engineKey: 'ondraketarn21l', numberKeys: [] }];
		expect((await inShop(theirs.ctx, (tx, ctx) => pricesFor(tx, ctx, ask))).size).toBe(0);
		const unknown = await getPrice(theirs.ctx, 999_999_999).catch(
			(thrown: Error) => thrown.message
		);
		await expect(getPrice(theirs.ctx, here.id)).rejects.toThrow(String(unknown));
		await expect(editPrice(theirs.ctx, here.id, input())).rejects.toThrow('not on the list');
		await expect(removePrice(theirs.ctx, here.id, 1)).rejects.toThrow('not on the list');
		await expect(putBackPrice(theirs.ctx, gone)).rejects.toThrow('any more');
		expect((await getPrice(ours.ctx, here.id)).source).toBe('canary');
	});
});
