import { checklist } from '$lib/trade';
import { NotFound } from '$lib/refusal';
import { beforeAll, describe, expect, it } from 'vitest';
import { bin, donorOnBench } from '../../../../tests/support/bench';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { editDonor, finishDonor, takeIn } from '../donors';
import { inShop } from '../context';
import { part } from './tables';
import { eq } from 'drizzle-orm';
import { getPart, kindsStillOn, listDonorParts, logOldStock, partsByIds, pullPart } from '.';

let ours: TestShop, theirs: TestShop, donor: string;

beforeAll(async () => {
	({ ours, theirs } = await testShops());
	donor = await donorOnBench(ours.ctx);
	await donorOnBench(theirs.ctx, { maker: 'Grauvik', model: 'BULK-54U' });
	await bin(ours.ctx, 'K3-1');
	await bin(ours.ctx, 'R1', true);
	await bin(theirs.ctx, 'Z9-9');
});

describe('pulling', () => {
	it('logs a part with the donor carried over, its own tag and its event', async () => {
		const logged = await pullPart(ours.ctx, donor, {
			kind: 'coil',
			grade: 'good used',
			numbers: ['TN-4471-02'],
			proof: { how: 'bench test cold', figure: 10, unit: 'kV', passed: true },
			bin: 'k3-1'
		});
		const view = await getPart(ours.ctx, logged.tag);
		expect(view).toMatchObject({
			state: 'shelved',
			bin: 'K3-1',
			donor,
			engine: 'Ondrake TARN-21L',
			grade: 'good used',
			numbers: ['TN-4471-02'],
			doubtful: false
		});
		expect(view.donorOf?.cause).toBe('stale-fuel');
		expect(view.proofs).toMatchObject([{ how: 'bench test cold', figure: 10, by: 'Wenna Oke' }]);
		expect(view.history).toMatchObject([
			{ id: logged.eventId, said: 'Logged as good used, put in K3-1', undo: true }
		]);
	});

	it('without a bin leaves it pulled, with a failed test in the red bin', async () => {
		const plain = await pullPart(ours.ctx, donor, { kind: 'recoil', grade: 'untested' });
		expect(plain.state).toBe('pulled');
		const failed = await pullPart(ours.ctx, donor, {
			kind: 'muffler',
			grade: 'usable',
			proof: { how: 'look-over', passed: false },
			bin: 'K3-1'
		});
		expect(await getPart(ours.ctx, failed.tag)).toMatchObject({
			state: 'back',
			bin: 'R1',
			inRedBin: true,
			doubtful: true
		});
	});

	it('refuses a never-reuse kind with the reason, and takes it as scrap', async () => {
		const refused = pullPart(ours.ctx, donor, { kind: 'rod', grade: 'good used' });
		await expect(refused).rejects.toMatchObject({
			code: 'gate',
			message: expect.stringMatching(/never used again.*scrapped or destroyed/)
		});
		const scrapped = await pullPart(ours.ctx, donor, {
			kind: 'rod',
			scrapped: { reason: 'never used again', destroyed: true }
		});
		expect(await getPart(ours.ctx, scrapped.tag)).toMatchObject({
			state: 'scrapped',
			destroyed: true,
			taken: 'Destroyed by Wenna Oke on Mar 14, 2026: never used again.'
		});
	});

	it('refuses what the cause of death ruined', async () => {
		const overspeed = await donorOnBench(ours.ctx, { cause: 'overspeed' });
		const ticked = {
			kind: 'flywheel',
			grade: 'good used',
			checklist: checklist('flywheel')
		} as const;
		await expect(pullPart(ours.ctx, overspeed, ticked)).rejects.toMatchObject({
			code: 'gate',
			message: expect.stringContaining('overspeed')
		});
		expect((await pullPart(ours.ctx, donor, ticked)).state).toBe('pulled');
	});

	it('keeps a safety kind only with every line ticked', async () => {
		const some = checklist('govspring').slice(1);
		const kept = { kind: 'govspring', grade: 'good used' } as const;
		await expect(pullPart(ours.ctx, donor, { ...kept, checklist: some })).rejects.toMatchObject({
			code: 'gate',
			field: 'checklist',
			message: expect.stringContaining(checklist('govspring')[0]!)
		});
		const whole = await pullPart(ours.ctx, donor, { ...kept, checklist: checklist('govspring') });
		expect((await getPart(ours.ctx, whole.tag)).checklist).toEqual(checklist('govspring'));
	});

	it('says what opens the gate of a donor that is not on the bench', async () => {
		const { number } = await takeIn(ours.ctx, { model: 'LOFT-16U' });
		await expect(
			pullPart(ours.ctx, number, { kind: 'coil', grade: 'usable' })
		).rejects.toMatchObject({ code: 'gate', message: expect.stringContaining('on the bench') });
		const stripped = await donorOnBench(ours.ctx);
		await finishDonor(ours.ctx, stripped);
		await expect(
			pullPart(ours.ctx, stripped, { kind: 'coil', grade: 'usable' })
		).rejects.toMatchObject({ code: 'gate' });
	});

	it('names a bin that is not there, and knows no bin of another shop', async () => {
		const into = (bin: string) =>
			pullPart(ours.ctx, donor, { kind: 'fuel-tank', grade: 'usable', bin });
		await expect(into('Z9-9')).rejects.toMatchObject({
			field: 'bin',
			message: expect.stringContaining('There is no bin Z9-9')
		});
	});
});

describe('old stock', () => {
	it('says itself which engine it fits; its cause is unknown', async () => {
		const logged = await logOldStock(ours.ctx, {
			kind: 'starter12',
			grade: 'usable',
			engine: 'Sollane FERN-9'
		});
		expect(await getPart(ours.ctx, logged.tag)).toMatchObject({
			donor: null,
			donorOf: null,
			engine: 'Sollane FERN-9'
		});
	});
});

describe('what is still on a donor', () => {
	it('leaves out what was logged and the pieces that went with it', async () => {
		const fresh = await donorOnBench(ours.ctx);
		const before = await kindsStillOn(ours.ctx, fresh);
		const kinds = before.map((row) => row.kind);
		expect(kinds).toContain('carb-float');
		expect(kinds).toContain('carb-bowl');
		expect(kinds).not.toContain('starter12');
		await pullPart(ours.ctx, fresh, { kind: 'carb-float', grade: 'untested' });
		const after = (await kindsStillOn(ours.ctx, fresh)).map((row) => row.kind);
		expect(after).not.toContain('carb-float');
		expect(after).not.toContain('carb-bowl');
	});

	it('puts what can never be stock last, with the reason', async () => {
		const rows = await kindsStillOn(ours.ctx, donor);
		const first = rows.findIndex((row) => row.never !== null);
		expect(first).toBeGreaterThan(0);
		expect(rows.slice(first).every((row) => row.never !== null)).toBe(true);
		expect(rows.every((row) => row.minutes >= 0)).toBe(true);
	});
});

describe('a donor that is read better later', () => {
	it('takes its parts along: what they are found and priced by', async () => {
		const late = await donorOnBench(ours.ctx, { maker: '', model: 'TWIN-7?U' });
		const { tag } = await pullPart(ours.ctx, late, { kind: 'coil', grade: 'usable' });
		await editDonor(ours.ctx, late, { maker: 'Grauvik', model: 'TWIN-72U' });
		const [row] = await inShop(ours.ctx, (tx) => tx.select().from(part).where(eq(part.tag, tag)));
		expect(row).toMatchObject({ engineKey: 'grauviktwin72u' });
	});
});

describe('another shop', () => {
	it('sees neither the part nor the donor', async () => {
		const { tag } = await pullPart(ours.ctx, donor, { kind: 'coil', grade: 'usable' });
		const [mine] = await listDonorParts(ours.ctx, (await getPart(ours.ctx, tag)).donorOf!.id);
		await expect(getPart(theirs.ctx, mine!.tag)).rejects.toThrow(NotFound);
		expect(await partsByIds(theirs.ctx, [mine!.id])).toEqual([]);
		await expect(pullPart(theirs.ctx, 'D4', { kind: 'coil', grade: 'usable' })).rejects.toThrow(
			NotFound
		);
	});
});
