import type { PriceInput } from '$lib/prices/input';
import { beforeAll, describe, expect, it } from 'vitest';
import { bin, donorOnBench } from '../../../../tests/support/bench';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { inShop, type Context } from '../context';
import { donorRow } from '../donors';
import { editPolicy, getPolicyRow, setSeason } from '../people';
import { putPrice } from '../prices';
import {
	getPart,
	holdPart,
	kindsStillOn,
	kindVerdicts,
	logOldStock,
	movePart,
	partVerdicts,
	provePart,
	pullPart
} from '.';

let ours: TestShop, theirs: TestShop;

beforeAll(async () => {
	({ ours, theirs } = await testShops());
	await bin(ours.ctx, 'K3-1');
	await bin(ours.ctx, 'R1', true);
});

const price = (over: Partial<PriceInput> = {}): PriceInput => ({
	kind: 'coil',
	engine: 'Ondrake TARN-21L',
	newCents: 10000,
	source: 'Counter book',
	seenOn: '2026-03-03',
	...over
});

/** An engine of its own for each test, so that the queues do not mix. */
let models = 0;
const engine = () => ({ maker: 'Ondrake', model: `TEST-${++models}` });
const said = ({ maker, model }: { maker: string; model: string }) => `${maker} ${model}`;

const pull = async (donor: string, kind = 'coil', ctx: Context = ours.ctx) => {
	const { tag } = await pullPart(ctx, donor, { kind, grade: 'untested', bin: 'K3-1' });
	return { tag, id: (await getPart(ctx, tag)).id };
};
const verdict = async (id: number, ctx: Context = ours.ctx) =>
	(await partVerdicts(ctx, [id])).get(id)!;
const donorId = (number: string) =>
	inShop(ours.ctx, async (tx, ctx) => (await donorRow(tx, ctx, number)).id);

describe('the verdict on a part', () => {
	it('needs a price until there is one for its engine, nearer for its number', async () => {
		const on = engine();
		const { id, tag } = await pull(await donorOnBench(ours.ctx, { ...on, cause: 'thrown-rod' }));
		expect((await verdict(id)).verdict).toBe('needs a price');
		await putPrice(ours.ctx, price({ engine: said(on) }));
		expect(await verdict(id)).toMatchObject({
			verdict: 'keep',
			askedCents: 6000,
			timing: 'when-called',
			place: 1,
			have: 1
		});
		expect((await getPart(ours.ctx, tag)).worth?.gainCents).toBe((await verdict(id)).gainCents);
	});

	it('follows what was proved', async () => {
		const on = engine();
		await putPrice(ours.ctx, price({ engine: said(on) }));
		const { id, tag } = await pull(await donorOnBench(ours.ctx, { ...on, cause: 'overheated' }));
		const before = await verdict(id);
		await provePart(ours.ctx, tag, { how: 'bench test cold', passed: true });
		const after = await verdict(id);
		expect(after.timing).toBeNull();
		expect(after.figures!.input.chanceGood).toBeCloseTo(15 / 16);
		expect(after.gainCents!).toBeGreaterThan(before.gainCents!);
	});

	it('gives equal parts of one donor successive places; held and red-bin ones stand aside', async () => {
		const on = engine();
		await putPrice(ours.ctx, price({ engine: said(on) }));
		const donor = await donorOnBench(ours.ctx, on);
		const three = [await pull(donor), await pull(donor), await pull(donor)];
		const places = async () =>
			[
				...(
					await partVerdicts(
						ours.ctx,
						three.map(({ id }) => id)
					)
				).values()
			].map(({ place, have }) => [place, have]);
		expect(await places()).toEqual([
			[1, 3],
			[2, 3],
			[3, 3]
		]);
		await holdPart(ours.ctx, three[0]!.tag, {
			for: 'job 9',
			until: '2026-03-20'
		});
		await movePart(ours.ctx, three[1]!.tag, { bin: 'R1' });
		expect((await places())[2]).toEqual([1, 1]);
	});

	it('counts old stock of the same engine or number with those off a donor', async () => {
		const on = engine();
		await putPrice(ours.ctx, price({ engine: said(on) }));
		const old = await logOldStock(ours.ctx, {
			kind: 'coil',
			grade: 'good used',
			engine: said(on).toUpperCase()
		});
		const { id } = await pull(await donorOnBench(ours.ctx, on));
		expect(await verdict(id)).toMatchObject({ place: 2, have: 2 });
		const { id: oldId } = await getPart(ours.ctx, old.tag);
		expect(await verdict(oldId)).toMatchObject({ place: 1, askedCents: 4500 });
	});

	it('follows the policy and the season of the shop', async () => {
		const on = engine();
		await putPrice(ours.ctx, price({ engine: said(on), seenOn: '2025-06-01' }));
		const { id } = await pull(await donorOnBench(ours.ctx, on));
		const before = await verdict(id);
		expect(before.stale).toBe(true);
		const { own, version } = await getPolicyRow(ours.ctx);
		await editPolicy(ours.ctx, {
			own: { ...own, families: { ondraketest5: 'lots' }, staleDays: 900 },
			version
		});
		await setSeason(ours.ctx, 'slow');
		const after = await verdict(id);
		expect(after.stale).toBe(false);
		expect(after.figures!.input.callsPerYear).toBeCloseTo(3 * before.figures!.input.callsPerYear);
		expect(after.figures!.input.labourNow).toBeCloseTo(2000 / 60);
		await setSeason(ours.ctx, 'normal');
	});

	it('shows its terms to those who may see them, the verdict to all', async () => {
		const on = engine();
		await putPrice(ours.ctx, price({ engine: said(on) }));
		const { id } = await pull(await donorOnBench(ours.ctx, on));
		const bench = await verdict(id, await ours.as('bench'));
		expect(bench.terms.length).toBeGreaterThan(10);
		const reader = await verdict(id, await ours.as('reader'));
		expect(reader).toMatchObject({
			verdict: bench.verdict,
			gainCents: bench.gainCents,
			terms: [],
			figures: null
		});
	});
});

describe('the verdicts on what is still on a donor', () => {
	it('pay for pulling, queue behind the shelf, and do not count as had', async () => {
		const on = engine();
		await putPrice(ours.ctx, price({ engine: said(on) }));
		const donor = await donorOnBench(ours.ctx, { ...on, cause: 'thrown-rod' });
		const at = await donorId(donor);
		const first = (await kindVerdicts(ours.ctx, at, ['coil', 'fuel-hose'])).get('coil')!;
		expect(first).toMatchObject({ verdict: 'keep', place: 1, have: 0 });
		expect(first.figures!.input.minutesNow).toBe(7);
		await pull(donor);
		const then = await kindVerdicts(ours.ctx, at, ['coil', 'fuel-hose']);
		expect(then.get('coil')).toMatchObject({ place: 2, have: 1 });
		expect(then.get('fuel-hose')!.verdict).toBe('never');
		expect((await kindsStillOn(ours.ctx, donor)).length).toBeGreaterThan(20);
	});
});

describe('another shop', () => {
	it('gives no verdict, no price and no place to it', async () => {
		const on = engine();
		const here = await pull(await donorOnBench(ours.ctx, on));
		await bin(theirs.ctx, 'K3-1');
		const foreign = await pull(await donorOnBench(theirs.ctx, on), 'coil', theirs.ctx);
		await putPrice(theirs.ctx, price({ engine: said(on) }));
		expect(await verdict(here.id)).toMatchObject({ verdict: 'needs a price', place: 1, have: 1 });
		expect((await partVerdicts(ours.ctx, [foreign.id])).size).toBe(0);
		await expect(kindVerdicts(theirs.ctx, await donorId('D1'), ['coil'])).rejects.toMatchObject({
			name: 'NotFound'
		});
	});
});
