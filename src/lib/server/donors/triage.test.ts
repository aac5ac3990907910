import { beforeAll, describe, expect, it } from 'vitest';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { TriageForm } from '$lib/donors/triage';
import { getDonor, getTriage, saveTriage, takeIn, undoTriage } from './index';

let ours: TestShop;
let theirs: TestShop;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
});

const donor = async () => (await takeIn(ours.ctx, { model: 'TARN-21L', class: 'R1' })).number;
const LOOK = { answers: { oil: 'empty', turn: 'solid', signs: ['tints'] }, inPlace: {} };

describe('the first look', () => {
	it('is kept with the donor, by whom', async () => {
		const number = await donor();
		expect(await getTriage(ours.ctx, number)).toMatchObject({
			answers: {},
			version: 0,
			undo: null
		});
		await saveTriage(await ours.as('bench'), number, { ...LOOK, version: 0 });
		expect(await getTriage(ours.ctx, number)).toMatchObject({
			answers: LOOK.answers,
			by: 'bench here',
			version: 1
		});
		expect((await getDonor(ours.ctx, number)).events[0]?.said).toBe('looked it over');
	});
	it('is not written over by somebody who did not see it', async () => {
		const number = await donor();
		await saveTriage(await ours.as('bench'), number, { ...LOOK, version: 0 });
		const late = saveTriage(ours.ctx, number, { answers: {}, inPlace: {}, version: 0 });
		await expect(late).rejects.toThrow('bench here looked it over meanwhile');
	});
	it('is taken back to what was answered before, once', async () => {
		const number = await donor();
		await saveTriage(ours.ctx, number, { ...LOOK, version: 0 });
		const again = { answers: { turn: 'free' }, inPlace: {}, version: 1 };
		const { eventId } = await saveTriage(ours.ctx, number, again);
		await undoTriage(ours.ctx, number, eventId);
		expect((await getTriage(ours.ctx, number)).answers).toEqual(LOOK.answers);
		await expect(undoTriage(ours.ctx, number, eventId)).rejects.toThrow(/again since/);
	});
	it('is nobody else’s', async () => {
		const number = await donor();
		await expect(getTriage(theirs.ctx, number)).rejects.toThrow(/not here/);
		await expect(saveTriage(theirs.ctx, number, { ...LOOK, version: 0 })).rejects.toThrow(
			/not here/
		);
	});
});

describe('the form', () => {
	it('gathers the answers and what was tried', () => {
		expect(
			TriageForm.parse({
				...{ turn: 'free', signs: ['fins'], version: '3' },
				...{ 'tried-starter12': 'worked', 'figure-starter12': '18,5', 'unit-starter12': 'A' },
				...{ 'tried-stator': 'not', 'tried-solenoid': 'failed' }
			})
		).toEqual({
			answers: { turn: 'free', signs: ['fins'] },
			inPlace: {
				starter12: { passed: true, figure: 18.5, unit: 'A' },
				solenoid: { passed: false, figure: null, unit: '' }
			},
			version: 3
		});
	});
	it('says in words what cannot be read', () => {
		const tried = { 'tried-coil': 'worked', 'figure-coil': 'lots' };
		const parsed = TriageForm.safeParse({ version: '0', turn: 'sideways', ...tried });
		expect(parsed.error?.issues.map(({ message }) => message)).toEqual([
			'“Turn the flywheel by hand, plug out”: choose an answer from the list',
			'Enter the figure as a number, like 18 or 18.5'
		]);
	});
});
