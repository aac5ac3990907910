import { NotFound } from '$lib/refusal';
import { beforeEach, describe, expect, it } from 'vitest';
import { donorOnBench } from '../../../../tests/support/bench';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { addKeptPhoto, changeShot, getDonor, removeDonorPhoto, takeIn } from '../donors';
import { findParts } from '../find';
import { readQuestion } from '$lib/find/input';
import {
	changePin,
	getPart,
	getPinnedPhoto,
	kindsStillOn,
	listPins,
	logOldStock,
	noteMeasure,
	placePin,
	pullPart,
	pullSeen,
	removePin,
	setRuler,
	undoChanges,
	undoPart
} from '.';

let ours: TestShop, theirs: TestShop, donor: string, photo: number;
const kept = () => ({
	key: `1/${crypto.randomUUID()}`,
	width: 1600,
	height: 1200,
	bytes: 1,
	blur: ''
});
const at = (x: number, y: number) => ({ x, y });

beforeEach(async () => {
	({ ours, theirs } = await testShops());
	donor = await donorOnBench(ours.ctx);
	photo = (await addKeptPhoto(ours.ctx, donor, kept(), 'box')).id;
});

const seen = () => getPinnedPhoto(ours.ctx, donor, photo);
const pinKind = (kind: string, x = 0.5) =>
	placePin(ours.ctx, donor, { photo, ...at(x, 0.5), kind });

describe('a pin', () => {
	it('marks a kind still to be pulled, numbered on its photo', async () => {
		const first = await pinKind('coil');
		const second = await pinKind('recoil', 0.2);
		expect([first.n, second.n]).toEqual([1, 2]);
		expect((await seen()).pins).toMatchObject([
			{ n: 1, x: 0.5, y: 0.5, kind: 'coil', part: null },
			{ n: 2, x: 0.2, kind: 'recoil', part: null }
		]);
	});

	it('marks a part off the same donor, and no other', async () => {
		const { tag } = await pullPart(ours.ctx, donor, { kind: 'coil', grade: 'usable' });
		await placePin(ours.ctx, donor, { photo, ...at(0.1, 0.9), part: tag });
		expect((await seen()).pins[0]).toMatchObject({
			kind: 'coil',
			part: { tag, grade: 'usable', state: 'pulled', place: null }
		});
		const other = await logOldStock(ours.ctx, { kind: 'coil', grade: 'usable' });
		await expect(
			placePin(ours.ctx, donor, { photo, ...at(0.1, 0.9), part: other.tag })
		).rejects.toMatchObject({
			field: 'what',
			message: `${other.tag} is not off ${donor}. Choose another.`
		});
	});

	it('refuses a kind that is not on the donor any more', async () => {
		await pullPart(ours.ctx, donor, { kind: 'coil', grade: 'usable' });
		await expect(pinKind('coil')).rejects.toMatchObject({
			field: 'what',
			message: expect.stringContaining('not on')
		});
	});

	it('takes any kind where nobody has said what the engine is', async () => {
		const { number } = await takeIn(ours.ctx, { model: 'LOFT-16U' });
		const { id } = await addKeptPhoto(ours.ctx, number, kept(), 'front');
		expect(
			await placePin(ours.ctx, number, { photo: id, ...at(0, 1), kind: 'coil' })
		).toMatchObject({
			n: 1
		});
	});

	it('is moved, becomes something else and is taken away, each undone', async () => {
		const placed = await pinKind('coil');
		const moved = await changePin(ours.ctx, donor, { pin: placed.id, ...at(0.9, 0.1) });
		const other = await changePin(ours.ctx, donor, { pin: placed.id, what: { kind: 'recoil' } });
		expect((await seen()).pins).toMatchObject([{ x: 0.9, y: 0.1, kind: 'recoil' }]);
		await expect(undoChanges(ours.ctx, [moved.eventId])).rejects.toMatchObject({ code: 'changed' });
		await undoChanges(ours.ctx, [other.eventId]);
		await undoChanges(ours.ctx, [moved.eventId]);
		expect((await seen()).pins).toMatchObject([{ x: 0.5, y: 0.5, kind: 'coil' }]);
		const removed = await removePin(ours.ctx, donor, placed.id);
		expect((await seen()).pins).toEqual([]);
		await expect(removePin(ours.ctx, donor, placed.id)).rejects.toBeInstanceOf(NotFound);
		await undoChanges(ours.ctx, [removed.eventId]);
		expect((await seen()).pins).toMatchObject([{ id: placed.id, n: 1 }]);
		await undoChanges(ours.ctx, [placed.eventId]);
		expect((await seen()).pins).toEqual([]);
	});

	it('that comes back gets another number where its own was given away', async () => {
		const first = await pinKind('coil');
		const removed = await removePin(ours.ctx, donor, first.id);
		expect((await pinKind('recoil')).n).toBe(1);
		await undoChanges(ours.ctx, [removed.eventId]);
		expect((await seen()).pins.map(({ n, kind }) => [n, kind])).toEqual([
			[1, 'recoil'],
			[2, 'coil']
		]);
	});

	it('placed twenty at once has a number of its own', async () => {
		const places = Array.from({ length: 20 }, (_, one) => one / 20);
		const done = await Promise.all(places.map((x) => pinKind('coil', x)));
		expect(done.map(({ n }) => n).sort((a, b) => a - b)).toEqual(places.map((_, one) => one + 1));
	});

	it('goes with its photo and says in the history of the donor what was done', async () => {
		await pinKind('coil');
		expect((await getDonor(ours.ctx, donor)).events[0]?.said).toBe(
			'pinned: 1, Ignition coil / magneto module'
		);
		await removeDonorPhoto(ours.ctx, donor, photo);
		expect(await listPins(ours.ctx, donor)).toEqual([]);
		await expect(seen()).rejects.toBeInstanceOf(NotFound);
		await expect(pinKind('recoil')).rejects.toBeInstanceOf(NotFound);
	});

	it('of another shop is not there, nor its photo', async () => {
		const { id } = await pinKind('coil');
		const their = await donorOnBench(theirs.ctx);
		const theirPhoto = await addKeptPhoto(theirs.ctx, their, kept(), 'box');
		expect(await listPins(theirs.ctx, their)).toEqual([]);
		for (const work of [
			() => removePin(theirs.ctx, their, id),
			() => changePin(theirs.ctx, their, { pin: id, ...at(0, 0) }),
			() => placePin(ours.ctx, donor, { photo: theirPhoto.id, ...at(0, 0), kind: 'coil' }),
			() => getPinnedPhoto(ours.ctx, donor, theirPhoto.id),
			() => setRuler(ours.ctx, donor, theirPhoto.id, { x1: 0, y1: 0, x2: 1, y2: 1, length: '1 in' })
		])
			await expect(work()).rejects.toBeInstanceOf(NotFound);
		expect((await seen()).pins).toHaveLength(1);
	});
});

describe('when the kind is pulled', () => {
	it('its pin follows to the part on every photo, and waits again when that was a mistake', async () => {
		const front = (await addKeptPhoto(ours.ctx, donor, kept(), 'front')).id;
		await pinKind('coil');
		await pinKind('coil', 0.7);
		await placePin(ours.ctx, donor, { photo: front, ...at(0.3, 0.3), kind: 'coil' });
		await pinKind('recoil');
		const { tag, eventId } = await pullPart(ours.ctx, donor, { kind: 'coil', grade: 'usable' });
		const tags = async () => (await listPins(ours.ctx, donor)).map(({ part }) => part?.tag ?? null);
		expect(await tags()).toEqual([tag, null, null, tag]);
		await undoPart(ours.ctx, eventId);
		expect(await tags()).toEqual([null, null, null, null]);
	});

	it('leaves the pins of other donors alone', async () => {
		const other = await donorOnBench(ours.ctx);
		await pinKind('coil');
		await pullPart(ours.ctx, other, { kind: 'coil', grade: 'usable' });
		expect((await seen()).pins[0]?.part).toBeNull();
	});
});

describe('the kinds seen in the box', () => {
	const kinds = [
		{ kind: 'coil', grade: 'untested' as const },
		{ kind: 'recoil', grade: 'good used' as const }
	];

	it('become parts in one go, in the box, and are all taken back in one', async () => {
		await pinKind('coil');
		const { tag: box } = await getDonor(ours.ctx, donor);
		const logged = await pullSeen(ours.ctx, donor, { kinds, bin: box });
		expect(logged).toHaveLength(2);
		expect(await getPart(ours.ctx, logged[1]!.tag)).toMatchObject({
			kind: 'recoil',
			grade: 'good used',
			bin: `box ${donor}`,
			donor
		});
		expect((await seen()).pins[0]?.part?.tag).toBe(logged[0]!.tag);
		await undoChanges(
			ours.ctx,
			logged.map(({ eventId }) => eventId)
		);
		expect((await getDonor(ours.ctx, donor)).parts).toEqual([]);
		expect((await kindsStillOn(ours.ctx, donor)).map(({ kind }) => kind)).toContain('coil');
	});

	it('are all logged or none', async () => {
		const mixed = [...kinds, { kind: 'rod', grade: 'usable' as const }];
		await expect(pullSeen(ours.ctx, donor, { kinds: mixed })).rejects.toMatchObject({
			code: 'gate'
		});
		expect((await getDonor(ours.ctx, donor)).parts).toEqual([]);
	});

	it('by two phones at once are there once', async () => {
		const both = await Promise.allSettled([
			pullSeen(ours.ctx, donor, { kinds }),
			pullSeen(ours.ctx, donor, { kinds })
		]);
		expect(both.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
		expect(both.find(({ status }) => status === 'rejected')).toMatchObject({
			reason: { code: 'taken', message: expect.stringContaining('Not on') }
		});
		expect((await getDonor(ours.ctx, donor)).parts).toHaveLength(2);
	});
});

describe('a ruler', () => {
	const inch = { x1: 0.1, y1: 0.5, x2: 0.35, y2: 0.5, length: '2 in' };
	const half = { x1: 0, y1: 0, x2: 0.5, y2: 0, what: 'bolt to bolt' };

	it('sets the scale of its photo; another takes its place, and undo brings it back', async () => {
		await setRuler(ours.ctx, donor, photo, inch);
		const { eventId } = await setRuler(ours.ctx, donor, photo, { ...inch, length: '25 mm' });
		expect((await seen()).ruler).toMatchObject({ x1: 0.1, mm: 25, said: '25 mm' });
		await undoChanges(ours.ctx, [eventId]);
		expect((await seen()).ruler).toMatchObject({ mm: 50.8, said: '2 in' });
	});

	it('alone is taken away by undo', async () => {
		const { eventId } = await setRuler(ours.ctx, donor, photo, inch);
		await undoChanges(ours.ctx, [eventId]);
		expect((await seen()).ruler).toBeNull();
	});

	it('says what to type or to set', async () => {
		const set = (over: Partial<typeof inch>) =>
			setRuler(ours.ctx, donor, photo, { ...inch, ...over });
		await expect(set({ length: 'a thumb' })).rejects.toMatchObject({ field: 'length' });
		await expect(set({ x2: 0.1 })).rejects.toMatchObject({ field: 'length' });
	});

	it('measures what a search then finds, and undo takes it off the part', async () => {
		const { tag } = await pullPart(ours.ctx, donor, {
			kind: 'carb-float',
			grade: 'usable',
			note: 'Gummed'
		});
		await expect(noteMeasure(ours.ctx, donor, photo, { ...half, part: tag })).rejects.toMatchObject(
			{
				code: 'gate'
			}
		);
		const plain = await pullPart(ours.ctx, donor, { kind: 'carb-float', grade: 'usable' });
		await setRuler(ours.ctx, donor, photo, inch);
		const noted = await noteMeasure(ours.ctx, donor, photo, { ...half, part: tag, as: 101.6 });
		expect((await getPart(ours.ctx, tag)).note).toBe(
			'Gummed\nbolt to bolt 4 in, 101.6 mm: 101.6 mm ±1.4 off a photo'
		);
		const find = async (q: string) =>
			(await findParts(ours.ctx, readQuestion(new URLSearchParams({ q })))).items.map(
				(one) => one.tag
			);
		expect(await find('carburetor 4 in')).toEqual([tag]);
		expect(await find('carb 101.6mm')).toEqual([tag]);
		expect((await getPart(ours.ctx, tag)).history[0]).toMatchObject({
			id: noted.eventId,
			said: expect.stringContaining('measured bolt to bolt 4 in'),
			undo: true
		});
		await undoChanges(ours.ctx, [noted.eventId]);
		expect((await getPart(ours.ctx, tag)).note).toBe('Gummed');
		expect(await find('carb 101.6mm')).toContain(plain.tag);
	});
});

it('what a photo shows can be said anew', async () => {
	await changeShot(ours.ctx, donor, photo, 'front');
	expect((await seen()).shot).toBe('front');
	expect((await getDonor(ours.ctx, donor)).events[0]?.said).toBe('said what a photo shows: front');
});
