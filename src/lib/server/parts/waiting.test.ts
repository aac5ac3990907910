import { beforeAll, describe, expect, it } from 'vitest';
import { bin, donorOnBench } from '../../../../tests/support/bench';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { inShop } from '../context';
import { donorRow } from '../donors';
import { putPrice } from '../prices';
import { addWant, closeWant, waitOn } from '../wants';
import { takeNotice } from '../wants/incoming';
import {
	choicesFor,
	getPart,
	holdPart,
	kindsStillOn,
	kindVerdicts,
	partVerdicts,
	planFor,
	pullPart
} from '.';

let ours: TestShop, theirs: TestShop;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
	await bin(ours.ctx, 'K3-1');
});

let models = 0;
const engine = () => ({ maker: 'Ondrake', model: `WAIT-${++models}` });
const said = ({ maker, model }: { maker: string; model: string }) => `${maker} ${model}`;
const price = (on: ReturnType<typeof engine>, kind: string, newCents: number) => ({
	...{ kind, newCents, engine: said(on), source: 'Counter book', seenOn: '2026-03-03' }
});
const big = { class: 'R1', fittings: ['12 V start'] } as const;
const onBench = (on: ReturnType<typeof engine>) =>
	donorOnBench(ours.ctx, { ...on, class: big.class, fittings: [...big.fittings] });
const kept = async (donor: string) =>
	(await planFor(ours.ctx, donor)).order.filter(({ keep }) => keep).map(({ id }) => id);
const wait = (on: string, kind = 'starter12') =>
	addWant(ours.ctx, { job: 'the red tiller', kind, engine: on });

/** The part as the queue's job would lay it beside those who wait. */
async function pulled(donor: string, kind: string, grade: 'usable' | 'untested' = 'usable') {
	const { id, tag } = await pullPart(ours.ctx, donor, { kind, grade, bin: 'K3-1' });
	const coming = { shopId: ours.ctx.shopId, partId: id, isNew: true };
	await takeNotice(ours.ctx.db, { ...coming, at: ours.ctx.now.toISOString() }, ours.ctx.now);
	return { id, tag };
}

describe('a new want', () => {
	it('moves the verdict, the plan and the choices of a donor, and closing it moves them back', async () => {
		const on = engine();
		const donor = await onBench(on);
		await putPrice(ours.ctx, price(on, 'starter12', 30_000));
		const { id } = await inShop(ours.ctx, (tx, ctx) => donorRow(tx, ctx, donor));
		const verdict = async () => (await kindVerdicts(ours.ctx, id, ['starter12'])).get('starter12')!;
		const before = { verdict: await verdict(), plan: await planFor(ours.ctx, donor) };
		const strip = async () =>
			(await choicesFor(ours.ctx, donor)).choices.find(({ choice }) => choice === 'strip')!.cents;
		const stripBefore = await strip();
		expect(before.verdict.waitingFor).toBeNull();

		const { number, matches } = await wait(said(on));
		expect(matches).toBe(1);
		const after = await verdict();
		expect(after.gainCents!).toBeGreaterThan(before.verdict.gainCents!);
		expect(after.waitingFor).toBe(`own job the red tiller (W${number})`);
		expect(after.terms.map(({ said }) => said)).toContain(
			`Somebody waits: own job the red tiller (W${number}); takes it`
		);
		const plan = await planFor(ours.ctx, donor);
		expect(plan.totalCents).toBeGreaterThan(before.plan.totalCents);
		const step = [...plan.order, ...plan.below].find((one) => one.id === 'starter12')!;
		expect(step.waitingFor).toBe(after.waitingFor);
		expect(await strip()).toBeGreaterThan(stripBefore);
		expect(
			(await kindsStillOn(ours.ctx, donor)).find(({ kind }) => kind === 'starter12')?.waitingFor
		).toBe(after.waitingFor);

		await closeWant(ours.ctx, `W${number}`);
		expect(await planFor(ours.ctx, donor)).toEqual(before.plan);
		await waitOn(ours.ctx, `W${number}`);
		expect((await planFor(ours.ctx, donor)).totalCents).toBe(plan.totalCents);
	});

	it('brings a part into the plan that was left on before', async () => {
		const on = engine();
		const donor = await onBench(on);
		await putPrice(ours.ctx, price(on, 'ringgear', 8000));
		expect(await kept(donor)).not.toContain('ringgear');
		const { number } = await wait(said(on), 'ringgear');
		expect(await kept(donor)).toContain('ringgear');
		await closeWant(ours.ctx, `W${number}`);
		expect(await kept(donor)).not.toContain('ringgear');
	});

	it('counts for the first unit alone, and for none once one is held for it', async () => {
		const on = engine();
		const donor = await onBench(on);
		await putPrice(ours.ctx, price(on, 'coil', 9000));
		await wait(said(on), 'coil');
		const [first, second] = [await pulled(donor, 'coil'), await pulled(donor, 'coil')];
		const waits = async () => {
			const found = await partVerdicts(ours.ctx, [first.id, second.id]);
			return [first, second].map(({ id }) => found.get(id)!.waitingFor !== null);
		};
		expect(await waits()).toEqual([true, false]);
		expect((await getPart(ours.ctx, first.tag)).worth!.waitingFor).toContain('own job');
		await holdPart(ours.ctx, first.tag, { for: 'somebody else' });
		expect(await waits()).toEqual([false, true]);
	});

	it('of another shop moves nothing here', async () => {
		const on = engine();
		const donor = await onBench(on);
		const before = await planFor(ours.ctx, donor);
		await addWant(theirs.ctx, { job: 'their job', kind: 'starter12', engine: said(on) });
		await addWant(theirs.ctx, { job: 'their job', kind: 'coil' });
		expect(await planFor(ours.ctx, donor)).toEqual(before);
	});
});
