import { replay } from '$lib/donors/state';
import { WANTED_SHOTS } from '$lib/donors/shots';
import { NotFound } from '$lib/refusal';
import { SAFE_TICKS } from '$lib/trade';
import { and, asc, eq } from 'drizzle-orm';
import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';
import { inShop, type Context } from '../context';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { editPolicy } from '../people';
import { event } from '../people/tables';
import { keepPhoto } from '../photos';
import { part } from '../parts/tables';
import { findTag, mintTag } from '../tags';
import {
	addBox,
	addDonorPhoto,
	bringBackDonor,
	editDonor,
	finishDonor,
	getDonor,
	leaveDonor,
	listDonors,
	listMakers,
	notToLeave,
	parkDonor,
	pullableDonor,
	putBackDonorPhoto,
	releaseDonor,
	removeDonorPhoto,
	reopenDonor,
	reviewDonor,
	stripDonor,
	takeIn,
	tickSafe,
	undoDonorMove,
	donorRow
} from '.';

let ours: TestShop;
let theirs: TestShop;
let bench: Context;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
	bench = await ours.as('bench');
});

const allTicks = SAFE_TICKS.map((tick) => tick.id);
const own = { route: 'own' as const, document: '' };
const caught = (work: Promise<unknown>) => work.catch((fault: unknown) => fault);
const plate = () =>
	sharp({ create: { width: 90, height: 60, channels: 3, background: '#777' } })
		.jpeg()
		.toBuffer();

/** A donor with every gate open but those left out. */
async function ready(ctx: Context, { holdUntil }: { holdUntil?: string } = {}): Promise<string> {
	const { number } = await takeIn(ctx, {
		maker: 'Grauvik',
		model: 'BULK-54U',
		cause: 'no-oil',
		sureness: 'seen',
		release: { ...own, holdUntil }
	});
	await tickSafe(ctx, number, { ticks: allTicks, version: 1 });
	return number;
}

const statesOf = (ctx: Context, id: number) =>
	inShop(ctx, (tx) =>
		tx
			.select({ toState: event.toState })
			.from(event)
			.where(and(eq(event.shopId, ctx.shopId), eq(event.about, 'donor'), eq(event.aboutId, id)))
			.orderBy(asc(event.id))
	);

describe('taking in', () => {
	it('gives the next number of the shop and a box with a tag', async () => {
		const one = await takeIn(bench, { model: 'TARN-21L' });
		const two = await takeIn(bench, { model: 'TARN-21L' });
		expect(Number(two.number.slice(1)) - Number(one.number.slice(1))).toBe(1);
		expect(await findTag(bench, one.tag)).toMatchObject({ what: 'box' });
		expect((await takeIn(theirs.ctx, { model: 'X' })).number).toBe('D1');
		expect(await getDonor(bench, one.tag.toLowerCase())).toEqual(await getDonor(bench, one.number));
	});

	it('never gives a number twice, however many come at once', async () => {
		const all = await Promise.all(
			Array.from({ length: 12 }, () => takeIn(ours.ctx, { model: 'LOFT-16U' }))
		);
		expect(new Set(all.map((one) => one.number)).size).toBe(12);
		expect(new Set(all.map((one) => one.tag)).size).toBe(12);
	});

	it('needs a model or a photo of the plate', async () => {
		expect(await caught(takeIn(bench, { maker: 'Ondrake' }))).toMatchObject({
			code: 'bad input',
			field: 'model',
			message: 'Enter the model, or add a photo of the plate.'
		});
		const kept = await keepPhoto(bench, await plate());
		const { number } = await takeIn(bench, {}, [kept]);
		const view = await getDonor(bench, number);
		expect(view).toMatchObject({ engine: 'Engine not read yet', state: 'whole' });
		expect(view.photos.map((photo) => photo.shot)).toEqual(['label']);
	});

	it('nags for what is missing', async () => {
		const { number } = await takeIn(bench, { model: 'TARN-21L' });
		const { todo, gates } = await getDonor(bench, number);
		expect(todo.map((one) => one.id)).toEqual(['release', 'cause', 'safe', 'photos']);
		expect(gates).toHaveLength(3);
	});

	it('keeps what was paid from those who do not see costs', async () => {
		expect(await caught(takeIn(bench, { model: 'A', paidCents: 900 }))).toMatchObject({
			code: 'role'
		});
		const { number } = await takeIn(ours.ctx, { model: 'A', paidCents: 900 });
		expect(await getDonor(bench, number)).not.toHaveProperty('paidCents');
		expect(await getDonor(ours.ctx, number)).toMatchObject({ paidCents: 900 });
		expect(JSON.stringify((await getDonor(bench, number)).events)).not.toContain('900');
	});
});

describe('the way to the bench', () => {
	it('is shut by each gate, all said at once', async () => {
		const { number } = await takeIn(bench, { model: 'REEF-17' });
		const shut = await caught(stripDonor(bench, number));
		expect(shut).toMatchObject({ code: 'gate' });
		expect(String(shut)).toMatch(/Record the release.*Name the cause.*Make it safe/s);
	});

	it('opens on the hold date in the time of the shop', async () => {
		const number = await ready(ours.ctx, { holdUntil: '2026-03-20' });
		expect(await caught(stripDonor(bench, number))).toMatchObject({
			message: 'Hold date is 20 March: not before then.'
		});
		const then = { ...bench, now: new Date('2026-03-20T00:00:01Z') };
		await stripDonor(then, number);
		expect((await getDonor(then, number)).state).toBe('on the bench');
	});

	it('the owner passes the release with a reason, nobody else and nothing else', async () => {
		const number = await ready(ours.ctx, { holdUntil: '2026-03-20' });
		const reason = 'the seller signed off early';
		expect(await caught(stripDonor(bench, number, { reason }))).toMatchObject({ code: 'gate' });
		expect(await caught(stripDonor(ours.ctx, number))).toMatchObject({ code: 'gate' });
		await stripDonor(ours.ctx, number, { reason });
		const { events } = await getDonor(ours.ctx, number);
		expect(events[0]?.said).toBe(`put on the bench: ${reason}`);
		const bare = await takeIn(ours.ctx, { model: 'REEF-17' });
		expect(await caught(stripDonor(ours.ctx, bare.number, { reason }))).toMatchObject({
			message: expect.stringMatching(/^Name the cause of death first\. Make it safe/)
		});
	});

	it('goes on to stripped and back, and the events replay to the state', async () => {
		const number = await ready(ours.ctx);
		const { id } = await getDonor(bench, number);
		const steps = [
			parkDonor,
			reopenDonor,
			parkDonor,
			stripDonor,
			finishDonor,
			reopenDonor,
			finishDonor
		];
		for (const step of steps) {
			await step(bench, number, { reason: 'a bracket was left' });
			expect(replay(await statesOf(bench, id))).toBe((await getDonor(bench, number)).state);
		}
		expect(await getDonor(bench, number)).toMatchObject({ state: 'stripped', todo: [] });
		expect((await getDonor(bench, number)).strippedAt).not.toBeNull();
		expect(await caught(reopenDonor(bench, number))).toMatchObject({ field: 'reason' });
		expect(await caught(stripDonor(bench, number))).toMatchObject({
			message: 'It is stripped. Only a donor that is whole or parked can do this.'
		});
	});

	it('leaves for good once the release is in order, and comes back to where it left', async () => {
		const held = await ready(ours.ctx, { holdUntil: '2099-01-01' });
		for (const how of ['scrap', 'sell'] as const)
			expect(String(await caught(leaveDonor(ours.ctx, held, how)))).toMatch(/Hold date/);
		const number = await ready(ours.ctx);
		const { id } = await getDonor(bench, number);
		expect(await caught(leaveDonor(bench, number, 'sell'))).toMatchObject({ code: 'role' });
		await stripDonor(bench, number);
		expect(await caught(leaveDonor(bench, number, 'scrap'))).toMatchObject({ code: 'gate' });
		await finishDonor(bench, number);
		await leaveDonor(bench, number, 'scrap', { run: 1 });
		expect(await getDonor(bench, number)).toMatchObject({ state: 'gone', todo: [] });
		await bringBackDonor(bench, number, { reason: 'the ticket was wrong' });
		expect((await getDonor(bench, number)).state).toBe('stripped');
		expect(replay(await statesOf(bench, id))).toBe('stripped');
		expect(await caught(bringBackDonor(bench, number, {}))).toMatchObject({ code: 'gate' });
	});

	it('a step is taken back while nothing came after it, and is whole only while all is on it', async () => {
		const number = await ready(ours.ctx);
		const { id } = await getDonor(bench, number);
		const parked = await parkDonor(bench, number);
		expect(await undoDonorMove(theirs.ctx, parked)).toBe(false);
		const stripped = await stripDonor(bench, number);
		expect(await caught(undoDonorMove(bench, parked))).toMatchObject({ code: 'changed' });
		expect(await undoDonorMove(bench, stripped)).toBe(true);
		expect((await getDonor(bench, number)).state).toBe('parked');
		const finished = await finishDonor(bench, number);
		await undoDonorMove(bench, finished);
		expect(await getDonor(bench, number)).toMatchObject({ state: 'parked', strippedAt: null });
		expect(replay(await statesOf(bench, id))).toBe('parked');
		const other = await ready(ours.ctx);
		const opened = await stripDonor(bench, other);
		await inShop(bench, async (tx, ctx) => {
			const { id } = await donorRow(tx, ctx, other);
			const tag = await mintTag(tx, ctx, 'part');
			const of = { shopId: ctx.shopId, tag, kind: 'coil', donorId: id, grade: 'untested' } as const;
			await tx
				.insert(part)
				.values({ ...of, state: 'pulled', pulledAt: ctx.now, changedAt: ctx.now });
		});
		expect(String(await caught(undoDonorMove(bench, opened)))).toMatch(/not whole any more/);
	});

	it('a release passed by the owner stays passed until a newer one is recorded', async () => {
		const number = await ready(ours.ctx, { holdUntil: '2099-01-01' });
		await stripDonor(ours.ctx, number, { reason: 'the yard floods' });
		const { id } = await getDonor(bench, number);
		const gate = () => inShop(bench, (tx, ctx) => notToLeave(tx, ctx, id));
		expect(await gate()).toBeNull();
		await releaseDonor(bench, number, { ...own, holdUntil: '2098-01-01', because: 'wrong year' });
		expect(await gate()).toMatch(/Hold date is 1 January 2098/);
	});

	it('so many may be parked, and each is looked at again', async () => {
		const { ours } = await testShops();
		await editPolicy(ours.ctx, { own: { parkedMost: 1, parkedReviewDays: 10 }, version: 0 });
		const [one, two] = [await ready(ours.ctx), await ready(ours.ctx)];
		await parkDonor(ours.ctx, one);
		expect(await caught(parkDonor(ours.ctx, two))).toMatchObject({
			message: expect.stringMatching(/^1 are parked already/)
		});
		const later = ours.at(new Date(ours.ctx.now.getTime() + 11 * 86_400_000));
		const todo = async (ctx: Context) => (await getDonor(ctx, one)).todo.map(({ id }) => id);
		expect(await todo(ours.ctx)).not.toContain('review');
		expect(await todo(later)).toContain('review');
		await reviewDonor(later, one);
		expect(await todo(later)).not.toContain('review');
		await reopenDonor(later, one);
		await parkDonor(ours.ctx, two);
	});

	it('two at once: one puts it there, the other hears where it is', async () => {
		const number = await ready(ours.ctx);
		const both = await Promise.allSettled([stripDonor(bench, number), stripDonor(bench, number)]);
		expect(both.filter((one) => one.status === 'fulfilled')).toHaveLength(1);
	});

	it('pulling is open on the bench, and parked with the release in order', async () => {
		const number = await ready(ours.ctx);
		const pull = () => inShop(bench, (tx, ctx) => pullableDonor(tx, ctx, number));
		expect(await caught(pull())).toMatchObject({ code: 'gate' });
		await parkDonor(bench, number);
		expect(await pull()).toMatchObject({ state: 'parked' });
		const { number: unreleased } = await takeIn(bench, { model: 'REEF-17' });
		await parkDonor(bench, unreleased);
		const other = inShop(bench, (tx, ctx) => pullableDonor(tx, ctx, unreleased));
		expect(String(await caught(other))).toMatch(/Record the release/);
	});
});

describe('editing', () => {
	it('from an old version is refused with both values', async () => {
		const { number, version } = await takeIn(bench, { model: 'TARN-29L', serial: '88?1' });
		await editDonor(bench, number, { serial: '8841', version });
		expect(await caught(editDonor(bench, number, { serial: '8871', version }))).toMatchObject({
			code: 'changed',
			message: `Somebody saved ${number} meanwhile: serial is now “8841”, you typed “8871”. Look and save again.`
		});
		expect((await getDonor(bench, number)).serial).toBe('8841');
	});

	it('a cause comes with how sure; the weakest claim when nobody said', async () => {
		const { number } = await takeIn(bench, { model: 'TARN-29L', cause: 'fire' });
		expect(await getDonor(bench, number)).toMatchObject({ cause: 'fire', sureness: 'told' });
		await editDonor(bench, number, { secondCause: 'fire', sureness: 'seen' });
		expect(await getDonor(bench, number)).toMatchObject({ secondCause: null, sureness: 'seen' });
		await editDonor(bench, number, { cause: null });
		expect(await getDonor(bench, number)).toMatchObject({ cause: null, sureness: null });
		const alone = editDonor(bench, number, { secondCause: 'flood' });
		expect(await caught(alone)).toMatchObject({ field: 'cause' });
	});

	it('the newest release stands, and one from tomorrow is refused', async () => {
		const { number } = await takeIn(bench, { model: 'TARN-29L', release: own });
		await releaseDonor(bench, number, { route: 'signed', document: 'job 1187', on: '2026-03-01' });
		expect((await getDonor(bench, number)).release).toMatchObject({
			route: 'signed',
			document: 'job 1187',
			on: '2026-03-01',
			by: 'bench here'
		});
		const early = releaseDonor(bench, number, { ...own, on: '2026-03-15' });
		expect(await caught(early)).toMatchObject({ code: 'bad input', field: 'on' });
	});
});

describe('boxes and photos', () => {
	it('a donor may have several boxes, each leading to it', async () => {
		const { number } = await takeIn(bench, { model: 'TWIN-72U' });
		const { tag } = await addBox(bench, number);
		expect((await getDonor(bench, tag)).number).toBe(number);
		expect((await getDonor(bench, number)).boxes).toHaveLength(2);
	});

	it('six views and the nagging for photos is over; one taken away can be put back', async () => {
		const { number } = await takeIn(bench, { model: 'TWIN-72U' });
		const bytes = await plate();
		const ids = [];
		for (const shot of WANTED_SHOTS) ids.push(await addDonorPhoto(bench, number, bytes, shot));
		const nagged = async () =>
			(await getDonor(bench, number)).todo.some((one) => one.id === 'photos');
		expect(await nagged()).toBe(false);
		await removeDonorPhoto(bench, number, ids[0]!.id);
		expect(await nagged()).toBe(true);
		await putBackDonorPhoto(bench, number, ids[0]!.id);
		expect(await nagged()).toBe(false);
		const { number: other } = await takeIn(bench, { model: 'TWIN-72U' });
		expect(await caught(removeDonorPhoto(bench, other, ids[1]!.id))).toBeInstanceOf(NotFound);
	});
});

describe('lists', () => {
	it('page by number and filter by state and words', async () => {
		const { ours: shop } = await testShops();
		for (const model of ['TARN-1', 'LOFT-2', 'TARN-3', 'LOFT-4', 'TARN-5'])
			await takeIn(shop.ctx, { maker: 'Ondrake', model, offMachine: `mower ${model}` });
		await parkDonor(shop.ctx, 'D2');
		const first = await listDonors(shop.ctx, { limit: 2 });
		expect(first.items.map((one) => one.number)).toEqual(['D5', 'D4']);
		const second = await listDonors(shop.ctx, { limit: 2, cursor: first.next ?? undefined });
		expect(second.items.map((one) => one.number)).toEqual(['D3', 'D2']);
		expect(
			(await listDonors(shop.ctx, { state: 'parked' })).items.map((one) => one.number)
		).toEqual(['D2']);
		expect((await listDonors(shop.ctx, { q: 'ondrake tarn' })).items).toHaveLength(3);
		expect((await listDonors(shop.ctx, { q: '100%' })).items).toHaveLength(0);
		expect(first.counts).toMatchObject({ whole: 4, parked: 1, gone: 0 });
		await takeIn(shop.ctx, { maker: 'Sollane', model: 'REEF' });
		expect(await listMakers(shop.ctx)).toEqual(['Sollane', 'Ondrake']);
	});
});

describe('another shop', () => {
	it('stays unseen, and its donors are not there, like those that never were', async () => {
		const foreign = await takeIn(theirs.ctx, { maker: 'Canary', model: 'CANARY-1' });
		const unknown = await caught(getDonor(ours.ctx, 'D99999'));
		expect(unknown).toBeInstanceOf(NotFound);
		expect(await caught(getDonor(ours.ctx, foreign.tag))).toEqual(unknown);
		for (const work of [stripDonor, parkDonor, finishDonor, reopenDonor, addBox])
			expect(await caught(work(ours.ctx, foreign.tag))).toEqual(unknown);
		expect(await caught(editDonor(ours.ctx, foreign.tag, { model: 'x' }))).toEqual(unknown);
		expect(await caught(releaseDonor(ours.ctx, foreign.tag, own))).toEqual(unknown);
		const seen = JSON.stringify([
			await listDonors(ours.ctx, { limit: 100 }),
			await listMakers(ours.ctx)
		]);
		expect(seen.toLowerCase()).not.toContain('canary');
	});
});
