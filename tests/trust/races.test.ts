import { and, eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { BinInput } from '../../src/lib/bins/input';
import { Refused } from '../../src/lib/refusal';
import { addBin, editBin, getBin, retireBin, useBinAgain } from '../../src/lib/server/bins';
import { inShop, type Context } from '../../src/lib/server/context';
import { editDonor, getDonor, takeIn } from '../../src/lib/server/donors';
import * as parts from '../../src/lib/server/parts';
import { expireHolds } from '../../src/lib/server/parts';
import { part } from '../../src/lib/server/parts/tables';
import * as people from '../../src/lib/server/people';
import { fingerprint, once } from '../../src/lib/server/people';
import { event } from '../../src/lib/server/people/tables';
import { editPrice, putPrice } from '../../src/lib/server/prices';
import { statesAndReplays } from '../support/bench';
import { NOON, testDb, testShops, type TestShop } from '../support/shops';
import { signUp } from '../../src/lib/server/people/sign-up';

let ours: TestShop;
beforeAll(async () => {
	({ ours } = await testShops());
	await addBin(ours.ctx, BinInput.parse({ address: 'K1-1', size: 'm' }));
});

const OLD = { kind: 'coil', grade: 'usable' as const, bin: 'K1-1', engine: 'Ondrake TARN-21L' };
const times = (n: number) => Array.from({ length: n }, (_, i) => i);

/** How each of many that were started together ended: 'done', or the code it was refused with. */
async function together(works: (() => Promise<unknown>)[]): Promise<string[]> {
	const ends = await Promise.allSettled(works.map((work) => work()));
	return ends.map((end) => {
		if (end.status === 'fulfilled') return 'done';
		if (end.reason instanceof Refused) return end.reason.code;
		throw end.reason;
	});
}

const count = (ends: string[], end: string) => ends.filter((one) => one === end).length;
const keyed = (ctx: Context, key: string, work: (ctx: Context) => Promise<unknown>) => () =>
	once(ctx, key, fingerprint('x', key), work);

describe('of many who want one part at once', () => {
	it('one gets it, the others hear who has it and where the next one is', async () => {
		const { tag } = await parts.logOldStock(ours.ctx, OLD);
		const next = await parts.logOldStock(ours.ctx, OLD);
		const hold = (i: number) => parts.holdPart(ours.ctx, tag, { for: `caller ${i}` });
		const ends = await Promise.allSettled(times(200).map(hold));
		const lost = ends.flatMap((end) => (end.status === 'rejected' ? [end.reason] : []));
		expect(lost).toHaveLength(199);
		for (const reason of lost) expect(reason).toMatchObject({ code: 'taken' });
		expect(`${lost[0]}`).toMatch(/Held for caller \d+ until .*Wenna Oke/);
		expect(`${lost[0]}`).toContain(next.tag);
		const held = await inShop(ours.ctx, (tx) =>
			tx.$count(event, and(eq(event.shopId, ours.ctx.shopId), eq(event.what, 'hold')))
		);
		expect(held).toBe(1);
	});

	it('where nobody locks, several get it: the test can fail', async () => {
		const { theirs: careless } = await testShops();
		const { id } = await parts.logOldStock(careless.ctx, { kind: 'coil', grade: 'usable' });
		const mine = and(eq(part.shopId, careless.ctx.shopId), eq(part.id, id));
		const naive = (i: number) =>
			inShop(careless.ctx, async (tx) => {
				const [row] = await tx.select().from(part).where(mine);
				if (row!.state !== 'pulled') throw new Refused('taken', 'gone');
				await tx
					.update(part)
					.set({ state: 'held', heldFor: `${i}` })
					.where(mine);
			});
		expect(count(await together(times(20).map((i) => () => naive(i))), 'done')).toBeGreaterThan(1);
	});

	it('a hold that runs out and a fitting at the same moment end in one of the two', async () => {
		for (const round of times(20)) {
			const { tag } = await parts.logOldStock(ours.ctx, OLD);
			await parts.holdPart(ours.ctx, tag, { for: 'x', until: '2026-03-14' });
			const late = ours.at(new Date('2026-03-15T09:00:00Z'));
			await together([
				() => expireHolds(ours.ctx.db, ours.ctx.shopId, late.now),
				() => parts.fitPart(late, tag, { job: `job ${round}` })
			]);
			expect((await parts.getPart(ours.ctx, tag)).state).toBe('out');
		}
	});

	it('any mix of moves leaves every part as its events tell', async () => {
		const tags: string[] = [];
		for (const _ of times(6)) tags.push((await parts.logOldStock(ours.ctx, OLD)).tag);
		const moves = [
			(tag: string) => parts.holdPart(ours.ctx, tag, { for: 'x' }),
			(tag: string) => parts.freePart(ours.ctx, tag),
			(tag: string) => parts.sellPart(ours.ctx, tag, { cents: 100 }),
			(tag: string) => parts.takeBackPart(ours.ctx, tag, { reason: 'x' }),
			(tag: string) => parts.missPart(ours.ctx, tag),
			(tag: string) => parts.foundPart(ours.ctx, tag),
			(tag: string) => parts.movePart(ours.ctx, tag, { bin: 'K1-1' }),
			(tag: string) => parts.provePart(ours.ctx, tag, { how: 'look-over', passed: true })
		];
		await together(
			times(240).map((i) => () => moves[(i * 7 + (i >> 3)) % moves.length]!(tags[i % 6]!))
		);
		for (const { state, replayed } of await statesAndReplays(ours.ctx))
			expect(replayed).toBe(state);
	});
});

describe('of two editors of the same version the second is told both values', () => {
	const second = async (edits: (() => Promise<unknown>)[], both: RegExp) => {
		const ends = await Promise.allSettled(edits.map((edit) => edit()));
		const [lost, ...more] = ends.filter((end) => end.status === 'rejected');
		expect(more).toEqual([]);
		expect(lost!.reason).toMatchObject({ code: 'changed' });
		expect(`${lost!.reason}`).toMatch(both);
	};

	it('a donor', async () => {
		const { number } = await takeIn(ours.ctx, { model: 'TARN-21L' });
		for (const round of times(25)) {
			const { version } = await getDonor(ours.ctx, number);
			const edit = (note: string) => () => editDonor(ours.ctx, number, { note, version });
			await second(
				[edit(`a${round}`), edit(`b${round}`)],
				/note is now “[ab]\d+”, you typed “[ab]/
			);
		}
	});

	it('a part', async () => {
		const { tag } = await parts.logOldStock(ours.ctx, OLD);
		for (const round of times(25)) {
			const { version } = await parts.getPart(ours.ctx, tag);
			const edit = (note: string) => () => parts.editPart(ours.ctx, tag, { note, version });
			await second(
				[edit(`a${round}`), edit(`b${round}`)],
				/now note: [ab]\d+. You typed note: [ab]/
			);
		}
	});

	it('a bin', async () => {
		const bin = BinInput.parse({ address: 'E1-1', size: 'm' });
		await addBin(ours.ctx, bin);
		for (const round of times(25)) {
			const { version } = await getBin(ours.ctx, 'E1-1');
			const edit = (purpose: string) => () =>
				editBin(ours.ctx, 'E1-1', { ...bin, purpose, version });
			await second([edit(`a${round}`), edit(`b${round}`)], /is now “[ab]\d+”, you typed “[ab]/);
		}
	});

	it('a price', async () => {
		const price = { kind: 'coil', engine: 'Pellwyn 4', source: 'x', seenOn: '2026-03-01' };
		const { id } = await putPrice(ours.ctx, { ...price, newCents: 1000 });
		for (const round of times(25)) {
			const edit = (newCents: number) => () =>
				editPrice(ours.ctx, id, { ...price, newCents, version: round + 1 });
			await second([edit(2000), edit(3000)], /now \$\d0\.00 new.*You typed \$\d0\.00 new/);
		}
	});

	it('the settings, each as a keyed change of another owner, and nobody waits in a circle', async () => {
		const other = await ours.as('owner');
		for (const round of times(25)) {
			const shop = await people.getShop(ours.ctx);
			const edit = (ctx: Context, name: string) =>
				keyed(ctx, `shop-${name}${round}`, (ctx) => people.editShop(ctx, { ...shop, name }));
			await second([edit(ours.ctx, 'A'), edit(other, 'B')], /name is now “[AB]”.*You typed “[AB]”/);
		}
	});

	it('two owners who change each other at once both stay whole', async () => {
		const { ours: shop } = await testShops();
		const other = await shop.as('owner');
		for (const round of times(10)) {
			const edit = (ctx: Context, memberId: number) =>
				keyed(ctx, `member-${memberId}-${round}`, (ctx) =>
					people.editMember(ctx, { memberId, version: round + 1, role: 'owner' })
				);
			const ends = await together([edit(shop.ctx, other.memberId), edit(other, shop.ctx.memberId)]);
			expect(ends).toEqual(['done', 'done']);
		}
	});
});

describe('what may be there once is there once', () => {
	it('a change sent 50 times at once with one key', async () => {
		const before = (await statesAndReplays(ours.ctx)).length;
		const send = keyed(ours.ctx, 'pull-once', (ctx) => parts.logOldStock(ctx, OLD));
		const answers = await Promise.all(times(50).map(send));
		expect(new Set(answers.map((one) => JSON.stringify(one))).size).toBe(1);
		expect((await statesAndReplays(ours.ctx)).length).toBe(before + 1);
		const other = once(ours.ctx, 'pull-once', fingerprint('x', 'another'), async () => 1);
		await expect(other).rejects.toMatchObject({ code: 'key reused' });
	});

	it('a price for one thing, whoever moves theirs there first', async () => {
		const price = { kind: 'coil', newCents: 1000, source: 'x', seenOn: '2026-03-01' };
		for (const round of times(10)) {
			const target = `Grauvik ${round}`;
			const ids: number[] = [];
			for (const name of ['one', 'two', 'six'])
				ids.push((await putPrice(ours.ctx, { ...price, engine: `Sollane ${name} ${round}` })).id);
			const ends = await together(
				ids.map((id) => () => editPrice(ours.ctx, id, { ...price, engine: target, version: 1 }))
			);
			expect(ends.toSorted()).toEqual(['done', 'taken', 'taken']);
		}
	});

	it('an address of a bin, whether added, renamed or brought back', async () => {
		for (const round of times(10)) {
			const [a, b, c] = ['A', 'B', 'C'].map((letter) =>
				BinInput.parse({ address: `${letter}${round}`, size: 'm' })
			);
			const { tag } = await addBin(ours.ctx, c!);
			await retireBin(ours.ctx, tag);
			await addBin(ours.ctx, a!);
			const ends = await together([
				() => editBin(ours.ctx, a!.address, { ...a!, address: c!.address, version: 1 }),
				() => addBin(ours.ctx, { ...b!, address: c!.address }),
				() => useBinAgain(ours.ctx, tag)
			]);
			expect(ends.toSorted()).toEqual(['done', 'taken', 'taken']);
		}
	});

	it('nothing is put into a bin while it is taken out of use', async () => {
		const { tag } = await parts.logOldStock(ours.ctx, OLD);
		for (const round of times(20)) {
			const { tag: bin } = await addBin(
				ours.ctx,
				BinInput.parse({ address: `Z${round}`, size: 'm' })
			);
			const ends = await together([
				() => parts.movePart(ours.ctx, tag, { bin }),
				() => retireBin(ours.ctx, bin)
			]);
			expect(count(ends, 'done')).toBe(1);
		}
	});

	it('the address of a shop, when several of one name open at once', async () => {
		const db = await testDb();
		const open = (i: number) =>
			signUp(
				db,
				{
					shopName: 'Twice Alike',
					yourName: 'Jory',
					email: `twice-${process.pid}-${i}@mail.example`,
					password: `a phrase that is long ${i}`,
					currency: 'EUR',
					timeZone: 'UTC',
					units: 'mm'
				},
				NOON
			);
		const opened = await Promise.all(times(4).map(open));
		expect(new Set(opened.map((one) => one.slug)).size).toBe(4);
	});
});
