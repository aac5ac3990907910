import { beforeEach, describe, expect, it } from 'vitest';
import { bin, donorOnBench } from '../../../../tests/support/bench';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import type { Observed } from '$lib/parts/learned-view';
import { withHistory } from '$lib/parts/learned';
import { DEFAULT_POLICY } from '$lib/people/policy';
import { readQuestion } from '../../find/input';
import { inShop, type Context } from '../context';
import { donorRow } from '../donors';
import { findParts } from '../find';
import { editPolicy } from '../people';
import { putPrice } from '../prices';
import { WantInput } from '../../wants/input';
import { addWant } from '../wants';
import {
	fitPart,
	freePart,
	getPart,
	holdPart,
	kindVerdicts,
	partVerdicts,
	provePart,
	pullPart,
	scrapPart,
	sellPart,
	takeBackPart,
	undoPart,
	whatItTaught
} from '.';
import { observed } from './observed';

let ours: TestShop, theirs: TestShop;
const START = new Date('2024-03-14T12:00:00Z');
const NOW = new Date('2026-03-14T12:00:00Z');
const ENGINE = 'ondraketarn21l';

beforeEach(async () => {
	({ ours, theirs } = await testShops());
	for (const shop of [ours, theirs]) {
		await bin(shop.ctx, 'K3-1');
		await bin(shop.ctx, 'R1', true);
	}
});

/** Coils and whatever else off one seized engine, pulled two years ago. */
async function coils(shop: TestShop, many: number, kind = 'coil') {
	const then = shop.at(START);
	const donor = await donorOnBench(then, { cause: 'overheated' });
	const tags: string[] = [];
	for (let n = 0; n < many; n += 1)
		tags.push((await pullPart(then, donor, { kind, grade: 'good used', bin: 'K3-1' })).tag);
	return { donor, tags };
}
const seen = (ctx: Context, kinds: string[] | null = null) =>
	inShop({ ...ctx, now: NOW }, (tx, ctx) => observed(tx, ctx, kinds));
const test = (ctx: Context, tag: string, passed: boolean) =>
	provePart(ctx, tag, { how: 'bench test cold', passed });

describe('what the history of a shop says', () => {
	it('is nothing in a new one', async () => {
		expect(await seen(ours.ctx)).toEqual({ tests: [], outs: [], calls: [], asked: [], sales: [] });
		expect(await whatItTaught(ours.ctx)).toEqual({ rows: [], moved: 0 });
	});

	it('counts each part by its latest bench test, not what a come-back showed', async () => {
		const { tags } = await coils(ours, 4);
		await provePart(ours.ctx, tags[0]!, { how: 'look-over', passed: true });
		await test(ours.ctx, tags[1]!, true);
		await test(ours.ctx, tags[2]!, false);
		await test(ours.ctx, tags[2]!, true);
		await test(ours.ctx, tags[3]!, true);
		await sellPart(ours.ctx, tags[3]!, { cents: 4000 });
		const later = ours.at(new Date(ours.ctx.now.getTime() + 1000));
		await takeBackPart(later, tags[3]!, { reason: 'no spark when hot' });
		await test(ours.at(new Date(later.now.getTime() + 1000)), tags[3]!, false);
		const { tests } = await seen(ours.ctx, ['coil']);
		expect(tests).toEqual([
			{
				...{ kind: 'coil', cause: 'overheated', secondCause: null, sureness: 'seen' },
				...{ passed: 3, failed: 0 }
			}
		]);
	});

	it('counts what went out and came back, less what was undone', async () => {
		const { tags } = await coils(ours, 4);
		const sold = await sellPart(ours.ctx, tags[0]!, { cents: 4000 });
		await undoPart(ours.ctx, sold.eventId);
		await fitPart(ours.ctx, tags[1]!, { job: 'Mower of Tamsin' });
		await takeBackPart(ours.ctx, tags[1]!, { reason: 'leaks' });
		await fitPart(ours.ctx, tags[2]!, { job: 'Tiller' });
		const back = await takeBackPart(ours.ctx, tags[2]!, { reason: 'the wrong one' });
		await undoPart(ours.ctx, back.eventId);
		await holdPart(ours.ctx, tags[3]!, { for: 'Tamsin' });
		const { outs, calls } = await seen(ours.ctx);
		expect(outs).toEqual([{ kind: 'coil', out: 2, back: 1 }]);
		expect(calls).toMatchObject([{ kind: 'coil', engineKey: ENGINE, calls: 3 }]);
		await freePart(ours.ctx, tags[3]!);
		expect((await seen(ours.ctx)).calls[0]!.calls).toBe(2);
	});

	it('watches only while one stands ready, and years that overlap once', async () => {
		const { tags } = await coils(ours, 2);
		const year = async () => (await seen(ours.ctx)).calls.find((row) => row.kind === 'coil')!.years;
		expect(await year()).toBeCloseTo(2, 2);
		const half = ours.at(new Date('2024-09-14T00:00:00Z'));
		await scrapPart(half, tags[0]!, { reason: 'cracked' });
		expect(await year()).toBeCloseTo(2, 2);
		await sellPart(ours.at(new Date('2025-03-14T12:00:00Z')), tags[1]!, { cents: 2000 });
		expect(await year()).toBeCloseTo(1, 2);
	});

	it('counts searches in vain, from the first on, while none stood ready', async () => {
		const ask = (shop: TestShop, q: string, day: string) =>
			findParts(shop.at(new Date(`${day}T12:00:00Z`)), readQuestion(new URLSearchParams({ q })));
		await ask(theirs, 'stator', '2024-01-14');
		await ask(ours, 'stator', '2024-03-14');
		await ask(ours, 'stator', '2024-03-14');
		await ask(ours, 'stator', '2025-03-14');
		const asked = async () => (await seen(ours.ctx)).asked;
		expect(await asked()).toMatchObject([{ kind: 'stator', engineKey: '', sought: 2, wanted: 0 }]);
		expect((await asked())[0]!.years).toBeCloseTo(2, 2);
		const want = { kind: 'stator', engine: 'TARN-21L', job: 'Mower of Tamsin', tellBy: 'phone' };
		await addWant(ours.at(NOW), WantInput.parse(want));
		await addWant(theirs.ctx, WantInput.parse(want));
		expect(await asked()).toMatchObject([{ kind: 'stator', sought: 2, wanted: 1 }]);
		const { tags } = await coils(ours, 1, 'stator');
		expect((await asked())[0]!.years).toBeCloseTo(0, 2);
		await sellPart(ours.at(new Date('2025-03-14T12:00:00Z')), tags[0]!, { cents: 2000 });
		expect((await asked())[0]!.years).toBeCloseTo(1, 2);
	});

	it('forgets what was logged by mistake', async () => {
		const { donor } = await coils(ours, 0);
		const proof = { how: 'bench test hot', passed: true } as const;
		const part = { kind: 'coil', grade: 'usable', bin: 'K3-1', proof } as const;
		const { eventId } = await pullPart(ours.ctx, donor, part);
		expect((await seen(ours.ctx)).tests).toHaveLength(1);
		await undoPart(ours.ctx, eventId);
		expect(await seen(ours.ctx)).toMatchObject({ tests: [], calls: [] });
	});

	it('takes the price beside what was paid', async () => {
		const price = { kind: 'coil', newCents: 10_000, source: 'list', seenOn: '2026-03-01' };
		await putPrice(ours.ctx, { ...price, engine: 'Ondrake TARN-21L', copyCents: 3000 });
		const { tags } = await coils(ours, 2);
		await sellPart(ours.ctx, tags[0]!, { cents: 4200 });
		await sellPart(ours.ctx, tags[1]!, { cents: 0 });
		const { sales } = await seen(ours.ctx);
		expect(sales).toEqual([
			{ grade: 'good used', newCents: 10_000, copyCents: 3000, paidCents: 4200 }
		]);
	});
});

describe('verdicts', () => {
	const priced = (ctx: Context) =>
		putPrice(ctx, {
			...{ kind: 'coil', engine: 'Ondrake TARN-21L', newCents: 10_000 },
			...{ source: 'list', seenOn: '2026-03-01' }
		});
	const onPart = async (ctx: Context, tag: string) => {
		const { id } = await getPart(ctx, tag);
		return (await partVerdicts(ctx, [id])).get(id)!.figures!.input;
	};

	it('count with it: on a part, on what is still on a donor, and said in their terms', async () => {
		await priced(ours.ctx);
		const { donor, tags } = await coils(ours, 5);
		const before = await onPart(ours.ctx, tags[0]!);
		for (const tag of tags.slice(1, 4)) await test(ours.ctx, tag, false);
		await sellPart(ours.ctx, tags[4]!, { cents: 2000 });
		const after = await onPart(ours.ctx, tags[0]!);
		expect(before.chanceGood).toBe(0.6);
		expect(after.chanceGood).toBeCloseTo((4 * 0.6) / 7, 12);
		expect(after.usedCents).toBeLessThan(before.usedCents);
		expect(after.callsPerYear).toBeCloseTo((10 + 1) / (10 / 0.98 + 2), 2);
		const { id } = await inShop(ours.ctx, (tx, ctx) => donorRow(tx, ctx, donor));
		const still = (await kindVerdicts(ours.ctx, id, ['coil'])).get('coil')!;
		expect(still.figures!.input.chanceGood).toBeCloseTo(2.4 / 7, 12);
		const good = still.terms.find(({ said }) => said === 'Good when fitted')!;
		expect(good.source).toContain('3 tested here, between ');
		const { rows } = await whatItTaught(ours.ctx);
		expect(rows.map(({ figure }) => figure)).toContain('Good, chance medium');
	});

	it('count calls for what was not asked about too, as to how busy the shop is', async () => {
		await priced(ours.ctx);
		const coil = await coils(ours, 1);
		const { tags } = await coils(ours, 6, 'recoil');
		for (const tag of tags) await sellPart(ours.ctx, tag, { cents: 2000 });
		const { callsPerYear } = await onPart(ours.ctx, coil.tags[0]!);
		const by = (observed: Observed) =>
			withHistory(DEFAULT_POLICY, observed).taught.calls('coil', ENGINE, 'some').mean;
		const [all, alone] = [await seen(ours.ctx), await seen(ours.ctx, ['coil'])];
		expect(callsPerYear).toBeCloseTo(by(all), 2);
		expect(by(all)).toBeGreaterThan(by(alone) * 1.2);
	});

	it('never with what another shop has seen', async () => {
		for (const shop of [ours, theirs]) await priced(shop.ctx);
		const here = await coils(ours, 1);
		const { tags } = await coils(theirs, 6);
		for (const tag of tags.slice(0, 3)) await test(theirs.ctx, tag, false);
		for (const tag of tags.slice(3)) await sellPart(theirs.ctx, tag, { cents: 1000 });
		const { tests, outs, calls, sales } = await seen(ours.ctx);
		expect({ tests, outs, sales }).toEqual({ tests: [], outs: [], sales: [] });
		expect(calls).toMatchObject([{ calls: 0 }]);
		expect((await onPart(ours.ctx, here.tags[0]!)).chanceGood).toBe(0.6);
		expect(
			(await whatItTaught(ours.ctx)).rows.filter(({ figure }) => !figure.startsWith('Calls'))
		).toEqual([]);
	});

	it('learn as slowly as the policy says', async () => {
		await priced(ours.ctx);
		const { tags } = await coils(ours, 2);
		await test(ours.ctx, tags[1]!, false);
		const priors = { chance: 999, comeBacks: 20, calls: 10, shareSales: 5 };
		await editPolicy(ours.ctx, { own: { priors }, version: 0 });
		expect((await onPart(ours.ctx, tags[0]!)).chanceGood).toBeCloseTo((0.6 * 999) / 1000, 12);
	});

	it('in a list of what was found follow as well', async () => {
		await priced(ours.ctx);
		const { tags } = await coils(ours, 4);
		for (const tag of tags.slice(1)) await test(ours.ctx, tag, false);
		const found = await findParts(ours.ctx, readQuestion(new URLSearchParams({ q: tags[0]! })));
		const { id } = await getPart(ours.ctx, tags[0]!);
		const { gainCents } = (await partVerdicts(ours.ctx, [id])).get(id)!;
		expect(found.items.find(({ tag }) => tag === tags[0])!.gainCents).toBe(gainCents);
	});
});
