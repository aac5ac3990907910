import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { emissionScene } from '../../../../fixtures/pictures/emission-label';
import { toJpeg } from '../../../../fixtures/pictures/jpeg';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { TakeLabel } from '../../donors/label-form';
import { NotFound } from '../../refusal';
import { inShop } from '../context';
import { event } from '../people/tables';
import { stopReader } from '../photos/text-reader';
import { editDonor } from './edit';
import { getDonor } from './get';
import { askReading } from './label-ask';
import { listReadings } from './label-readings';
import { takeLabel, undoTakeLabel } from './label-take';
import { fillReading } from './label-work';
import { addDonorPhoto, removeDonorPhoto } from './photos';
import { takeIn } from './take-in';

const LABEL = {
	maker: 'Ondrake',
	family: 'HNDKS.2101AB',
	displacement: '210 cc',
	model: 'TARN-33E',
	code: '16110704',
	serial: '7719024'
};

let ours: TestShop;
let theirs: TestShop;
let picture: Buffer;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
	picture = await toJpeg(emissionScene(LABEL));
});
afterAll(stopReader);

/** A donor with a photo of its label. */
async function labelled({ ctx } = ours) {
	const { number } = await takeIn(ctx, { model: 'NEW', maker: 'Ondrake' });
	const photo = await addDonorPhoto(ctx, number, picture, 'label');
	return { number, photo: photo.id };
}

const form = (reading: number, version: number, over: Record<string, unknown>) =>
	TakeLabel.parse({ reading, version, ...over });

const eventsOf = (donorId: number) =>
	inShop(ours.ctx, (tx) =>
		tx
			.select({ what: event.what, detail: event.detail })
			.from(event)
			.where(and(eq(event.about, 'donor'), eq(event.aboutId, donorId)))
			.orderBy(event.id)
	);

describe('a reading', () => {
	it('is asked for, then filled in, and offers without filling in', async () => {
		const { number, photo } = await labelled();
		const { id } = await askReading(ours.ctx, number, photo);
		expect(await listReadings(ours.ctx, number)).toMatchObject([
			{ id, state: 'waits', offers: [] }
		]);
		expect(await askReading(ours.ctx, number, photo)).toEqual({ id });
		await fillReading(ours.ctx, id);
		const [reading] = await listReadings(ours.ctx, number);
		expect(reading).toMatchObject({ id, photoId: photo, state: 'read', width: 1200, height: 900 });
		const offers = Object.fromEntries(reading!.offers.map(({ field, value }) => [field, value]));
		expect(offers).toMatchObject({ maker: 'Ondrake', model: 'TARN-33E', displacementCc: '210' });
		expect(await getDonor(ours.ctx, number)).toMatchObject({ model: 'NEW', displacementCc: null });
	});

	it('is done once, and again only when it is asked for again', async () => {
		const { number, photo } = await labelled();
		const first = await askReading(ours.ctx, number, photo);
		await fillReading(ours.ctx, first.id);
		const [done] = await listReadings(ours.ctx, number);
		await fillReading(ours.ctx, first.id);
		expect(await listReadings(ours.ctx, number)).toEqual([done]);
		const again = await askReading(ours.ctx, number, photo);
		expect(again.id).not.toBe(first.id);
		expect(await listReadings(ours.ctx, number)).toMatchObject([{ id: again.id, state: 'waits' }]);
	});

	it('that never came may be asked for again after two minutes', async () => {
		const { number, photo } = await labelled();
		const first = await askReading(ours.ctx, number, photo);
		const later = ours.at(new Date(ours.ctx.now.getTime() + 121_000));
		expect((await askReading(later, number, photo)).id).not.toBe(first.id);
	});

	it('of a photo whose bytes are gone has failed, and says so', async () => {
		const { number, photo } = await labelled();
		const { id } = await askReading(ours.ctx, number, photo);
		await removeDonorPhoto(ours.ctx, number, photo);
		await fillReading(ours.ctx, id);
		expect(await listReadings(ours.ctx, number)).toEqual([]);
		await expect(askReading(ours.ctx, number, photo)).rejects.toThrow(NotFound);
	});

	it('is not there for another shop, nor for another donor', async () => {
		const mine = await labelled();
		const foreign = await labelled(theirs);
		const { id } = await askReading(theirs.ctx, foreign.number, foreign.photo);
		await expect(askReading(ours.ctx, mine.number, foreign.photo)).rejects.toThrow(NotFound);
		await fillReading(ours.ctx, id);
		expect(await listReadings(theirs.ctx, foreign.number)).toMatchObject([{ state: 'waits' }]);
		expect(await listReadings(ours.ctx, mine.number)).toEqual([]);
		const take = form(id, 1, { take: ['model'], model: 'X1' });
		await expect(takeLabel(ours.ctx, mine.number, take)).rejects.toThrow(NotFound);
	});
});

describe('what is taken over', () => {
	async function asked() {
		const { number, photo } = await labelled();
		const { id } = await askReading(ours.ctx, number, photo);
		return { number, id };
	}

	it('is what was ticked or typed, and no more', async () => {
		const { number, id } = await asked();
		const take = form(id, 1, {
			take: ['model', 'displacementCc', 'emissionFamily'],
			own: ['typeCode', 'serial'],
			...{ maker: 'Grauvik', model: 'TARN-33E', displacementCc: '12.9 cu in' },
			...{ emissionFamily: 'HNDKS.2101AB', typeCode: '', serial: '77?9024' }
		});
		const { said } = await takeLabel(ours.ctx, number, take);
		expect(said).toBe('model, serial, displacement, emission family');
		const donor = await getDonor(ours.ctx, number);
		expect(donor).toMatchObject({
			...{ maker: 'Ondrake', model: 'TARN-33E', serial: '77?9024', typeCode: '' },
			...{ displacementCc: 211.4, emissionFamily: 'HNDKS.2101AB', version: 2 }
		});
		expect(donor.events[0]!.said).toBe(
			'took over from the plate: model, serial, displacement, emission family'
		);
		expect((await eventsOf(donor.id)).at(-1)!.detail).toMatchObject({
			reading: id,
			before: { model: 'NEW', serial: '', displacementCc: null, emissionFamily: '' }
		});
	});

	it('is refused when somebody saved in between', async () => {
		const { number, id } = await asked();
		await editDonor(ours.ctx, number, { model: 'TARN-40', version: 1 });
		const take = form(id, 1, { take: ['model'], model: 'TARN-33E' });
		await expect(takeLabel(ours.ctx, number, take)).rejects.toMatchObject({
			code: 'changed',
			message: expect.stringContaining('model is now “TARN-40”, you typed “TARN-33E”')
		});
	});

	it('is put back as it was, until somebody changes it', async () => {
		const { number, id } = await asked();
		const take = form(id, 1, { take: ['model', 'serial'], model: 'TARN-33E', serial: '7719024' });
		const { eventId } = await takeLabel(ours.ctx, number, take);
		await undoTakeLabel(ours.ctx, number, eventId);
		expect(await getDonor(ours.ctx, number)).toMatchObject({ model: 'NEW', serial: '' });
		await expect(undoTakeLabel(ours.ctx, number, eventId)).rejects.toThrow(NotFound);
		const again = await takeLabel(ours.ctx, number, {
			...take,
			edit: { ...take.edit, version: 3 }
		});
		await editDonor(ours.ctx, number, { serial: '7' });
		await expect(undoTakeLabel(ours.ctx, number, again.eventId)).rejects.toMatchObject({
			code: 'changed'
		});
	});
});
