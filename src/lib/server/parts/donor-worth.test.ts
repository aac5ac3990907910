import { beforeAll, describe, expect, it } from 'vitest';
import { bin, donorOnBench } from '../../../../tests/support/bench';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { inShop } from '../context';
import { setSeason } from '../people';
import { donorRow, editDonor, takeIn } from '../donors';
import { putPrice } from '../prices';
import { choicesFor, getPart, kindVerdicts, partVerdicts, planFor, pullPart, workOut } from '.';

let ours: TestShop, theirs: TestShop;

beforeAll(async () => {
	({ ours, theirs } = await testShops());
	await bin(ours.ctx, 'K3-1');
});

let models = 0;
const engine = () => ({ maker: 'Ondrake', model: `PLAN-${++models}` });
const said = ({ maker, model }: { maker: string; model: string }) => `${maker} ${model}`;
const price = (on: ReturnType<typeof engine>, kind: string, newCents: number) => ({
	...{ kind, newCents, engine: said(on), source: 'Counter book', seenOn: '2026-03-03' }
});
const kept = (plan: Awaited<ReturnType<typeof planFor>>) =>
	plan.order.filter(({ keep }) => keep).map(({ id }) => id);

describe('the pull plan', () => {
	it('recomputes as a price is entered, a part logged, the season changed', async () => {
		const on = engine();
		const donor = await donorOnBench(ours.ctx, { ...on, class: 'R1', fittings: ['12 V start'] });
		const unpriced = await planFor(ours.ctx, donor, 30);
		expect(unpriced.unpriced).toBeGreaterThan(30);
		await putPrice(ours.ctx, price(on, 'starter12', 60_000));
		const priced = await planFor(ours.ctx, donor, 30);
		expect(kept(priced)).toContain('starter12');
		expect(priced.unpriced).toBe(unpriced.unpriced - 1);
		expect(priced.totalCents).toBeGreaterThan(unpriced.totalCents);
		await pullPart(ours.ctx, donor, { kind: 'starter12', grade: 'untested', bin: 'K3-1' });
		const after = await planFor(ours.ctx, donor, 30);
		expect(after.order.map(({ id }) => id)).not.toContain('starter12');
		expect(after.below.map(({ id }) => id)).not.toContain('starter12');
		await setSeason(ours.ctx, 'rush');
		const rush = await planFor(ours.ctx, donor);
		await setSeason(ours.ctx, 'normal');
		expect(rush.minutes).toBeLessThan((await planFor(ours.ctx, donor)).minutes);
	});

	it('the price and the season of another shop never count', async () => {
		const on = engine();
		const donor = await donorOnBench(ours.ctx, { ...on, class: 'R1', fittings: ['12 V start'] });
		const before = await planFor(ours.ctx, donor, 60);
		const there = await donorOnBench(theirs.ctx, { ...on, class: 'R1', fittings: ['12 V start'] });
		await putPrice(theirs.ctx, price(on, 'starter12', 90_000));
		await setSeason(theirs.ctx, 'rush');
		expect(await planFor(ours.ctx, donor, 60)).toEqual(before);
		expect((await planFor(theirs.ctx, there, 60)).totalCents).not.toBe(before.totalCents);
	});

	it('is empty while nobody has said the class', async () => {
		const { number } = await takeIn(ours.ctx, { model: 'WHAT-1' });
		expect(await planFor(ours.ctx, number)).toMatchObject({ order: [], below: [], totalCents: 0 });
	});
});

it('what was paid for a donor changes no verdict of its parts, no plan and no choice', async () => {
	const on = engine();
	const donor = await donorOnBench(ours.ctx, { ...on, class: 'R1', fittings: ['12 V start'] });
	await putPrice(ours.ctx, price(on, 'starter12', 30_000));
	await putPrice(ours.ctx, price(on, 'coil', 9000));
	const { tag } = await pullPart(ours.ctx, donor, { kind: 'coil', grade: 'usable', bin: 'K3-1' });
	const { id } = await getPart(ours.ctx, tag);
	const row = () => inShop(ours.ctx, (tx, ctx) => donorRow(tx, ctx, donor));
	const all = async () => ({
		pulled: (await partVerdicts(ours.ctx, [id])).get(id),
		still: await kindVerdicts(ours.ctx, (await row()).id, ['starter12', 'recoil']),
		plan: await planFor(ours.ctx, donor, 30),
		choices: (await choicesFor(ours.ctx, donor)).choices
	});
	const before = await all();
	expect(before.pulled!.figures).toBeDefined();
	for (const paidCents of [4000, 250_000]) {
		await editDonor(ours.ctx, donor, { paidCents });
		expect((await row()).paidCents).toBe(paidCents);
		expect(await all()).toEqual(before);
	}
});

describe('the five choices', () => {
	it('follow the figures given, and rise with what its parts bring', async () => {
		const on = engine();
		const whole = { ...on, class: 'R1', fittings: ['12 V start'], cause: 'no-oil' } as const;
		const { number } = await takeIn(ours.ctx, { ...whole, fittings: ['12 V start'] });
		const usual = await choicesFor(ours.ctx, number);
		expect(usual.choices.map(({ choice }) => choice).toSorted()).toEqual(
			['fix', 'park', 'scrap', 'strip', 'whole'].toSorted()
		);
		const dear = await choicesFor(ours.ctx, number, { wholePriceCents: 90_000 });
		expect(dear.choices[0]!.choice).toBe('whole');
		await putPrice(ours.ctx, price(on, 'starter12', 60_000));
		const stripped = (view: typeof usual) => view.choices.find(({ choice }) => choice === 'strip')!;
		const priced = await choicesFor(ours.ctx, number);
		expect(stripped(priced).cents).toBeGreaterThan(stripped(usual).cents);
		await putPrice(theirs.ctx, price(on, 'stator', 90_000));
		expect(await choicesFor(ours.ctx, number)).toEqual(priced);
	});

	it('a reader sees the choices without what they are made of', async () => {
		const { number } = await takeIn(ours.ctx, { ...engine(), class: 'WB', fittings: ['recoil'] });
		const seen = await choicesFor(await ours.as('reader'), number);
		expect(seen.figures).toBeNull();
		expect(seen.choices).toEqual((await choicesFor(ours.ctx, number)).choices);
	});

	it('ask for the class first: its figures follow from it', async () => {
		const { number } = await takeIn(ours.ctx, { model: 'WHAT-2' });
		await expect(choicesFor(ours.ctx, number)).rejects.toMatchObject({ code: 'gate' });
	});
});

describe('the calculator', () => {
	const asked = {
		kind: 'starter12',
		cause: 'no-oil',
		grade: 'untested',
		newCents: 13_600,
		copyCents: null,
		have: 0,
		stillOn: false,
		season: null
	} as const;

	it('works out a part that nobody has logged', async () => {
		const verdict = await workOut(ours.ctx, asked);
		expect(verdict).toMatchObject({ verdict: 'keep', have: 0, place: 1 });
		expect(verdict.terms.length).toBeGreaterThan(5);
		expect((await workOut(ours.ctx, { ...asked, have: 3 })).gainCents).toBeLessThan(
			verdict.gainCents!
		);
		const rush = await workOut(ours.ctx, { ...asked, stillOn: true, season: 'rush' });
		expect(rush.gainCents).toBeLessThan(verdict.gainCents!);
	});

	it('without a price says from which one it pays', async () => {
		const verdict = await workOut(ours.ctx, { ...asked, newCents: null });
		expect(verdict.verdict).toBe('needs a price');
		const at = verdict.breakEvenNewCents!;
		expect((await workOut(ours.ctx, { ...asked, newCents: at + 200 })).gainCents).toBeGreaterThan(
			(await workOut(ours.ctx, { ...asked, newCents: at - 200 })).gainCents!
		);
	});
});
