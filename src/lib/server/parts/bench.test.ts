import { beforeAll, describe, expect, it } from 'vitest';
import { donorOnBench, statesAndReplays } from '../../../../tests/support/bench';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { saveTriage } from '../donors';
import { benchFor, cleaningFor, cleanPart, getPart, leaveKindOn } from './index';
import { provePart, pullPart, takeKindUp, undoPart, watchBench } from './index';
import { putPrice } from '../prices';
import { closeLine } from '../db/listen';

let ours: TestShop;
let theirs: TestShop;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
	return closeLine;
});

const RIDER = { class: 'R1', fittings: ['12 V start', 'charging'], cause: 'no-oil' } as const;
const rider = () => donorOnBench(ours.ctx, { ...RIDER, fittings: [...RIDER.fittings] });
const on = async (donor: string, kind: string) =>
	(await benchFor(ours.ctx, donor)).kinds.find((one) => one.kind === kind);

describe('the bench of a donor', () => {
	it('has the plan first, in the order of work, with what the screen says of each', async () => {
		const donor = await rider();
		const { kinds, open, logged, done } = await benchFor(ours.ctx, donor);
		expect([open, logged, done]).toEqual([true, 0, []]);
		const plans = kinds.map(({ plan }) => plan !== null);
		expect(plans.lastIndexOf(true)).toBeLessThan(plans.indexOf(false));
		const starter = kinds.find(({ kind }) => kind === 'starter12')!;
		expect(starter).toMatchObject({ level: 'medium', hot: true, have: 0, never: null });
		expect(starter.why).toEqual(['Somebody pulled or cranked on a locked engine.']);
		expect(starter.grades).toMatchObject({ '': 'untested', 'worked in place': 'good used' });
		expect(starter.fields.map(({ unit }) => unit)).toEqual(['A', 'rpm', 'V']);
		expect(kinds.find(({ kind }) => kind === 'rod')?.never).toMatch(/never used again/);
	});

	it('shows what came off, by whom, and takes it back', async () => {
		const donor = await rider();
		const mate = await ours.as('bench');
		const { tag } = await pullPart(mate, donor, { kind: 'starter12', grade: 'good used' });
		const seen = await benchFor(ours.ctx, donor);
		expect(seen.logged).toBe(1);
		expect(seen.done).toEqual([
			expect.objectContaining({ tag, kind: 'starter12', by: 'bench here', mine: false })
		]);
		expect((await benchFor(mate, donor)).done[0]?.mine).toBe(true);
		expect(await on(donor, 'starter12')).toBeUndefined();
		await undoPart(ours.ctx, seen.done[0]!.undo!);
		expect((await benchFor(ours.ctx, donor)).done).toEqual([]);
		expect(await on(donor, 'starter12')).toBeDefined();
	});

	it('offers no undo once something else was done with the part', async () => {
		const donor = await rider();
		const { tag } = await pullPart(ours.ctx, donor, { kind: 'muffler', grade: 'usable' });
		await cleanPart(ours.ctx, tag, { cameRight: true });
		expect((await benchFor(ours.ctx, donor)).done[0]).toMatchObject({ tag, undo: null });
	});

	it('what is left on leaves the plan, stays on the donor, and is taken up again', async () => {
		const donor = await rider();
		const planned = (await benchFor(ours.ctx, donor)).kinds.find(({ plan }) => plan === 'keep')!;
		await leaveKindOn(ours.ctx, donor, planned.kind);
		await leaveKindOn(ours.ctx, donor, planned.kind);
		const { leftOn, kinds } = await benchFor(ours.ctx, donor);
		expect(leftOn.map(({ kind }) => kind)).toEqual([planned.kind]);
		expect(kinds.some(({ kind }) => kind === planned.kind)).toBe(false);
		await takeKindUp(ours.ctx, donor, planned.kind);
		expect(await on(donor, planned.kind)).toMatchObject({ plan: 'keep' });
	});

	it('what stands behind a kind that is left on stays on with it', async () => {
		const donor = await rider();
		await leaveKindOn(ours.ctx, donor, 'flywheel');
		const { kinds, leftOn } = await benchFor(ours.ctx, donor);
		expect(leftOn.map(({ kind }) => kind)).toEqual(['flywheel']);
		for (const { behind, plan } of kinds)
			if (behind.some((name) => name.startsWith('Flywheel ('))) expect(plan).not.toBe('keep');
	});

	it('does not leave on what came off already', async () => {
		const donor = await rider();
		await pullPart(ours.ctx, donor, { kind: 'coil', grade: 'untested' });
		await expect(leaveKindOn(ours.ctx, donor, 'coil')).rejects.toThrow(/not on it any more/);
	});

	it('brings what was tried in place to the part', async () => {
		const donor = await rider();
		const inPlace = { starter12: { passed: true, figure: 18, unit: 'A' } };
		await saveTriage(ours.ctx, donor, { answers: { turn: 'free' }, inPlace, version: 0 });
		expect(await on(donor, 'starter12')).toMatchObject({
			proof: { how: 'worked in place', passed: true, figure: 18, unit: 'A' }
		});
	});

	it('is told of every change of its donor, whoever makes it, and of no other', async () => {
		const donor = await rider();
		const other = await rider();
		const heard: string[] = [];
		const watch = [await watchBench(ours.ctx, donor), await watchBench(ours.ctx, other)] as const;
		const stops = [watch[0](() => heard.push('ours')), watch[1](() => heard.push('other'))];
		// the line tells those who wait for it that it is open
		await expect.poll(() => heard.length, { timeout: 5000 }).toBeGreaterThanOrEqual(2);
		heard.length = 0;
		await pullPart(await ours.as('bench'), donor, { kind: 'coil', grade: 'untested' });
		await expect.poll(() => heard, { timeout: 5000 }).toEqual(['ours']);
		stops.forEach((stop) => stop());
	});

	it('is nobody else’s', async () => {
		const donor = await rider();
		const nothing = /not here/;
		await expect(benchFor(theirs.ctx, donor)).rejects.toThrow(nothing);
		await expect(watchBench(theirs.ctx, donor)).rejects.toThrow(nothing);
		await expect(leaveKindOn(theirs.ctx, donor, 'coil')).rejects.toThrow(nothing);
	});
});

describe('what a test read', () => {
	it('stays with the part, each figure by its field', async () => {
		const donor = await rider();
		const { tag } = await pullPart(ours.ctx, donor, { kind: 'starter12', grade: 'good used' });
		await provePart(ours.ctx, tag, {
			how: 'bench test hot',
			passed: true,
			figures: { current: 21, speed: 4200 }
		});
		const { proofs, history } = await getPart(ours.ctx, tag);
		expect(proofs[0]).toMatchObject({ figure: 21, unit: 'A' });
		expect(proofs[0]?.figures).toEqual([
			{ field: 'Free run, current', value: 21, unit: 'A' },
			{ field: 'Free run, speed', value: 4200, unit: 'rpm' }
		]);
		expect(history[0]?.said).toContain('Free run, current 21 A');
	});
	it('is refused where the test of the kind reads no such thing', async () => {
		const donor = await rider();
		const proof = { how: 'bench test cold', passed: true, figures: { soup: 1 } } as const;
		const pull = pullPart(ours.ctx, donor, { kind: 'coil', grade: 'good used', proof });
		await expect(pull).rejects.toThrow(/reads no “soup”/);
		expect((await benchFor(ours.ctx, donor)).logged).toBe(0);
	});
});

describe('cleaning', () => {
	it('counts attempts, and says when to stop', async () => {
		const donor = await donorOnBench(ours.ctx, { cause: 'retired' });
		const engine = 'Ondrake TARN-21L';
		await putPrice(ours.ctx, {
			...{ kind: 'carb-float', engine, newCents: 15_000 },
			...{ source: 'list', seenOn: '2026-03-01' }
		});
		const { tag } = await pullPart(ours.ctx, donor, { kind: 'carb-float', grade: 'untested' });
		const first = await cleaningFor(ours.ctx, tag);
		expect(first).toMatchObject({ attempts: 0, failures: 0, advice: { go: true } });
		let failures = 0;
		while ((await cleaningFor(ours.ctx, tag))!.advice!.go) {
			await cleanPart(ours.ctx, tag, { cameRight: false });
			if (++failures > 30) throw new Error('it never says stop');
		}
		expect(failures).toBe(first!.advice!.stopAfter);
		const { history } = await getPart(ours.ctx, tag);
		expect(history[0]?.said).toBe('Cleaned: not right yet');
		await undoPart(ours.ctx, history[0]!.id);
		expect(await cleaningFor(ours.ctx, tag)).toMatchObject({ attempts: failures - 1 });
		await cleanPart(ours.ctx, tag, { cameRight: true });
		expect(await cleaningFor(ours.ctx, tag)).toMatchObject({ attempts: failures, failures: 0 });
		for (const { state, replayed } of await statesAndReplays(ours.ctx))
			expect(replayed).toBe(state);
	});
	it('says nothing where nothing is cleaned, and nothing to others', async () => {
		const donor = await rider();
		const { tag } = await pullPart(ours.ctx, donor, { kind: 'carb-float', grade: 'untested' });
		await expect(cleaningFor(theirs.ctx, tag)).rejects.toThrow(/not here/);
		await expect(cleanPart(theirs.ctx, tag, { cameRight: true })).rejects.toThrow(/not here/);
	});
});
