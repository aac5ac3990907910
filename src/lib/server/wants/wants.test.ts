import { CustomerInput } from '$lib/customers/input';
import { beforeAll, describe, expect, it } from 'vitest';
import { and, eq } from 'drizzle-orm';
import { bin, donorOnBench } from '../../../../tests/support/bench';
import { queued } from '../../../../tests/support/queue';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { inShop, type Context } from '../context';
import { addCustomer, eraseCustomer, getCustomer, saveLetterSettings } from '../customers';
import { letter } from '../customers/tables';
import { editDonor, takeIn } from '../donors';
import {
	editPart,
	fitPart,
	foundPart,
	freePart,
	getPart,
	holdPart,
	logOldStock,
	missPart,
	movePart,
	noteFit,
	pullPart,
	takeBackPart
} from '../parts';
import { replaceNumber } from '../prices';
import {
	addWant,
	closeWant,
	countFresh,
	countWants,
	donorWanted,
	draftFor,
	dropMatch,
	editWant,
	getWant,
	listWants,
	partWanted,
	quietWants,
	sayNo,
	sayYes,
	seeWant,
	takeOffWant,
	tellWant,
	undoWant,
	waitOn
} from '.';
import { forgetCustomer } from './erased';
import { lookAgain, takeNotice, type Incoming } from './incoming';

let ours: TestShop, theirs: TestShop;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
	await bin(ours.ctx, 'K3-1');
	await bin(ours.ctx, 'R1', true);
});

let models = 0;
const engine = () => ({ maker: 'Pellwyn', model: `WQ-${++models}X` });
const said = ({ maker, model }: { maker: string; model: string }) => `${maker} ${model}`;
let people = 0;
const person = (over: Partial<CustomerInput> = {}): CustomerInput =>
	CustomerInput.parse({
		...{ name: `Ida Brennick ${++people}`, email: `ida-${people}-${process.pid}@mail.example` },
		...over
	});

const came = (incoming: Partial<Incoming>, { ctx } = ours) =>
	takeNotice(
		ctx.db,
		{ shopId: ctx.shopId, at: ctx.now.toISOString(), isNew: true, ...incoming },
		ctx.now
	);
const later = (minutes: number) => ours.at(new Date(ours.ctx.now.getTime() + minutes * 60_000));
const found = async (number: number) =>
	(await getWant(ours.ctx, `W${number}`)).found.map(
		({ part, donor }) => part?.tag ?? donor?.number
	);
const old = async (on: string, over = {}) => {
	const made = await logOldStock(ours.ctx, {
		...{ kind: 'recoil', grade: 'good used', engine: on, bin: 'K3-1' },
		...over
	});
	await came({ partId: made.id });
	return made;
};

describe('a want', () => {
	it('is laid beside shelf and donors at once, the best fit first', async () => {
		const on = engine();
		const donor = await takeIn(ours.ctx, { ...on, class: 'GP', fittings: ['recoil'] });
		const same = await old(said(on));
		const byNumber = await old('Grauvik 5', { numbers: ['PW 16-0412'] });
		const { number, matches } = await addWant(ours.ctx, {
			...{ customer: person(), kind: 'recoil', engine: said(on), numbers: ['pw160412'] }
		});
		expect(matches).toBe(3);
		expect(await found(number)).toEqual([byNumber.tag, same.tag, donor.number]);
	});

	it('finds by measures, by replaced numbers and by what was tried', async () => {
		const measured = await old('', { label: 'recoil, 62 mm bolt circle' });
		const byMeasure = await addWant(ours.ctx, { job: 'a', kind: 'recoil', measures: '62 mm' });
		expect(await found(byMeasure.number)).toEqual([measured.tag]);
		await replaceNumber(ours.ctx, { number: 'OLD 71', by: 'NEW 72', ways: 'one', note: '' });
		const fresh = await old('', { numbers: ['NEW 72'] });
		const stale = await addWant(ours.ctx, { job: 'b', numbers: ['OLD-71'] });
		expect(await found(stale.number)).toEqual([fresh.tag]);
		const [on, other] = [engine(), engine()];
		const tried = await old(said(on));
		await noteFit(ours.ctx, tried.tag, {
			...{ engine: said(other), fits: 'yes', because: '', ways: 'one' }
		});
		const asks = await addWant(ours.ctx, { job: 'c', kind: 'recoil', engine: said(other) });
		expect(await found(asks.number)).toEqual([tried.tag]);
	});

	it('hears of what comes in, once, and again when it comes in again', async () => {
		const on = engine();
		const { number } = await addWant(ours.ctx, {
			...{ customer: person(), kind: 'recoil', engine: said(on) }
		});
		const made = await old(said(on));
		await came({ partId: made.id });
		const first = await getWant(ours.ctx, `W${number}`);
		expect(first.found.map(({ isNew, rank }) => [isNew, rank])).toEqual([[true, 2]]);
		await seeWant(ours.ctx, `W${number}`);
		await came({ partId: made.id });
		expect((await getWant(ours.ctx, `W${number}`)).fresh).toBe(0);

		await holdPart(ours.ctx, made.tag, { for: 'somebody' });
		expect(await found(number)).toEqual([]);
		await freePart(ours.ctx, made.tag);
		await came({ partId: made.id, at: later(5).now.toISOString() });
		expect((await getWant(ours.ctx, `W${number}`)).fresh).toBe(1);
		await seeWant(ours.ctx, `W${number}`);
		await missPart(ours.ctx, made.tag);
		await foundPart(ours.ctx, made.tag);
		await came({ partId: made.id, at: later(10).now.toISOString() });
		expect((await getWant(ours.ctx, `W${number}`)).fresh).toBe(1);
		await seeWant(ours.ctx, `W${number}`);
		await fitPart(ours.ctx, made.tag, { job: 'mower' });
		await takeBackPart(ours.ctx, made.tag, { reason: 'not needed' });
		await came({ partId: made.id, at: later(15).now.toISOString() });
		const back = await getWant(ours.ctx, `W${number}`);
		expect(back.found.map(({ part }) => part?.state)).toEqual(['back']);
		expect(back.fresh).toBe(1);
	});

	it('hears of a donor when it is taken in, and when its class is said later', async () => {
		const on = engine();
		const { number } = await addWant(ours.ctx, { job: 'x', kind: 'recoil', engine: said(on) });
		const donor = await takeIn(ours.ctx, on);
		await came({ donorId: donor.id });
		expect(await found(number)).toEqual([]);
		await editDonor(ours.ctx, donor.number, { class: 'GP', fittings: ['recoil'] });
		await came({ donorId: donor.id, isNew: false });
		expect(await found(number)).toEqual([donor.number]);
		expect(await donorWanted(ours.ctx, donor.id)).toMatchObject([{ number }]);
	});

	it('is not answered by what the cause of death ruined, nor by what was pulled', async () => {
		const on = engine();
		const donor = await donorOnBench(ours.ctx, { ...on, class: 'GP', fittings: ['recoil'] });
		const { number } = await addWant(ours.ctx, { job: 'x', kind: 'recoil', engine: said(on) });
		expect(await found(number)).toEqual([donor]);
		const made = await pullPart(ours.ctx, donor, { kind: 'recoil', grade: 'usable', bin: 'K3-1' });
		await came({ partId: made.id });
		expect(await found(number)).toEqual([made.tag]);
	});

	it('misses nothing that came in beside it', async () => {
		const on = engine();
		const added = await addWant(ours.ctx, { job: 'x', kind: 'recoil', engine: said(on) });
		const made = await logOldStock(ours.ctx, { kind: 'recoil', grade: 'usable', engine: said(on) });
		const at = ours.ctx.now.toISOString();
		await lookAgain(ours.ctx.db, { shopId: ours.ctx.shopId, wantId: added.id, at }, ours.ctx.now);
		expect(await found(added.number)).toEqual([made.tag]);
	});

	it('changed, is compared anew; what answers no more goes', async () => {
		const [on, other] = [engine(), engine()];
		const [one, two] = [await old(said(on)), await old(said(other))];
		const { number } = await addWant(ours.ctx, { job: 'x', kind: 'recoil', engine: said(on) });
		expect(await found(number)).toEqual([one.tag]);
		const { version } = await getWant(ours.ctx, `W${number}`);
		const ctx = later(1);
		await editWant(ctx, `W${number}`, { engine: said(other), mostCents: 4000, version });
		expect(await found(number)).toEqual([two.tag]);
		await expect(editWant(ctx, `W${number}`, { note: 'y', version })).rejects.toThrow(
			'note is now nothing, you typed y'
		);
	});
});

describe('parts and donors', () => {
	it('announce what came in with the change itself, each coming once', async () => {
		const on = engine();
		const made = await logOldStock(ours.ctx, { kind: 'recoil', grade: 'usable', engine: said(on) });
		const told = async () =>
			(await queued<Incoming>('parts.came-in')).filter(({ partId }) => partId === made.id);
		expect((await told()).map(({ isNew }) => isNew)).toEqual([true]);
		await movePart(ours.ctx, made.tag, { bin: 'K3-1' });
		expect(await told()).toHaveLength(1);
		await holdPart(ours.ctx, made.tag, { for: 'x' });
		await freePart(ours.ctx, made.tag);
		expect(await told()).toHaveLength(2);
		const { version } = await getPart(ours.ctx, made.tag);
		await editPart(ours.ctx, made.tag, { numbers: ['PW 1'], version });
		expect((await told()).map(({ isNew }) => isNew)).toEqual([true, true, false]);
		const donor = await takeIn(ours.ctx, on);
		const carried = async () =>
			(await queued<Incoming>('donors.came-in')).filter(({ donorId }) => donorId === donor.id);
		expect(await carried()).toHaveLength(1);
		await editDonor(ours.ctx, donor.number, { class: 'GP' });
		expect((await carried()).map(({ isNew }) => isNew)).toEqual([true, false]);
	});
});

describe('who waits', () => {
	it('is entered once: the same number or address is the same person', async () => {
		const ida = person({ phone: '555-0142' });
		const first = await addWant(ours.ctx, { customer: ida, kind: 'recoil' });
		const again = await addWant(ours.ctx, {
			...{ customer: { ...ida, name: 'I. Brennick', email: '' }, kind: 'coil' }
		});
		const who = async (number: number) => (await getWant(ours.ctx, `W${number}`)).customerId;
		expect(await who(again.number)).toBe(await who(first.number));
	});

	it('is named to the counter alone; the bench hears that somebody waits', async () => {
		const on = engine();
		const ida = person();
		await addWant(ours.ctx, { customer: ida, kind: 'recoil', engine: said(on) });
		const { id } = await old(said(on));
		const bench = JSON.stringify(await partWanted(await ours.as('bench'), id));
		expect(bench).toContain('a customer (W');
		expect(bench).not.toContain('Ida');
		expect(JSON.stringify(await partWanted(await ours.as('counter'), id))).toContain(ida.name);
		const foreign = await partWanted(theirs.ctx, id);
		expect(foreign).toEqual([]);
	});
});

const lettersOf = (ctx: Context, id: number) =>
	inShop(ctx, (tx) =>
		tx
			.select()
			.from(letter)
			.where(and(eq(letter.shopId, ctx.shopId), eq(letter.about, 'want'), eq(letter.aboutId, id)))
	);

describe('telling', () => {
	it('by e-mail writes the letter with the change, in the words of the shop', async () => {
		const on = engine();
		const ida = person();
		const { tag } = await old(said(on));
		const added = await addWant(ours.ctx, { customer: ida, kind: 'recoil', engine: said(on) });
		const draft = await draftFor(ours.ctx, `W${added.number}`);
		await tellWant(ours.ctx, `W${added.number}`, { by: 'e-mail' });
		const [sent] = await lettersOf(ours.ctx, added.id);
		expect(sent).toMatchObject({ to: ida.email, state: 'waiting', subject: draft!.subject });
		expect(sent!.text).toContain(`a used recoil starter assembly off ${said(on)}, good used.`);
		expect(sent!.text).not.toContain(tag);
		const told = await getWant(ours.ctx, `W${added.number}`);
		expect(told).toMatchObject({ state: 'told', toldBy: 'e-mail', letter: 'waiting', fresh: 0 });
	});

	it('rolled back leaves no letter', async () => {
		const on = engine();
		await old(said(on));
		const added = await addWant(ours.ctx, { customer: person(), kind: 'recoil', engine: said(on) });
		const broken = inShop(ours.ctx, async (_tx, ctx) => {
			await tellWant(ctx, `W${added.number}`, { by: 'e-mail' });
			throw new Error('broken off');
		});
		await expect(broken).rejects.toThrow('broken off');
		expect(await lettersOf(ours.ctx, added.id)).toEqual([]);
		expect((await getWant(ours.ctx, `W${added.number}`)).state).toBe('waiting');
	});

	it('by letter needs an address and something that is here', async () => {
		const nobody = await addWant(ours.ctx, {
			...{ customer: person({ email: '', phone: '555-0199' }), kind: 'recoil', engine: 'Sollane 1' }
		});
		const tell = (number: number) => tellWant(ours.ctx, `W${number}`, { by: 'e-mail' });
		await expect(tell(nobody.number)).rejects.toThrow('no e-mail address');
		const nothing = await addWant(ours.ctx, {
			...{ customer: person(), kind: 'recoil', engine: 'Sollane 2' }
		});
		await expect(tell(nothing.number)).rejects.toThrow('Nothing is here');
		await tellWant(ours.ctx, `W${nobody.number}`, { by: 'phone' });
		expect((await getWant(ours.ctx, `W${nobody.number}`)).toldBy).toBe('phone');
	});

	it('happens by itself only where the shop wants it, and once', async () => {
		const { ours: shop } = await testShops();
		const tellable = { kind: 'recoil' as const, engine: 'Pellwyn 9X' };
		const first = await addWant(shop.ctx, { customer: person(), ...tellable });
		const make = () =>
			logOldStock(shop.ctx, { kind: 'recoil', grade: 'usable', engine: 'Pellwyn 9X' });
		await came({ partId: (await make()).id }, shop);
		expect(await lettersOf(shop.ctx, first.id)).toEqual([]);
		await saveLetterSettings(shop.ctx, {
			...{ replyTo: '', tellByItself: true, quietDays: 7, version: 0 }
		});
		const made = await make();
		await came({ partId: made.id }, shop);
		await came({ partId: made.id }, shop);
		await came({ partId: (await make()).id }, shop);
		expect(await lettersOf(shop.ctx, first.id)).toHaveLength(1);
		const { state, history } = await getWant(shop.ctx, `W${first.number}`);
		expect(state).toBe('told');
		expect(history[0]!.said).toBe('Told by e-mail, by itself');
	});
});

describe('the answer', () => {
	it('yes holds the part for the want, without a name; no lets it go', async () => {
		const on = engine();
		const { tag } = await old(said(on));
		const { number } = await addWant(ours.ctx, {
			...{ customer: person(), kind: 'recoil', engine: said(on) }
		});
		await sayYes(ours.ctx, `W${number}`, { part: tag });
		expect(await getPart(ours.ctx, tag)).toMatchObject({ state: 'held', heldBy: `W${number}` });
		expect((await getWant(ours.ctx, `W${number}`)).kept).toBe(tag);
		await sayNo(ours.ctx, `W${number}`);
		expect((await getPart(ours.ctx, tag)).state).toBe('shelved');
	});

	it('a hold that ended puts the want back on the look-out', async () => {
		const on = engine();
		const { tag, id } = await old(said(on));
		const { number } = await addWant(ours.ctx, {
			...{ customer: person(), kind: 'recoil', engine: said(on) }
		});
		await sayYes(ours.ctx, `W${number}`, { part: tag });
		await freePart(ours.ctx, tag);
		await came({ partId: id, at: later(1).now.toISOString() });
		const again = await getWant(ours.ctx, `W${number}`);
		expect(again).toMatchObject({ state: 'said yes', kept: null, fresh: 1 });
	});

	it('no answer for the days of the shop is quiet; it can wait on', async () => {
		const { number } = await addWant(ours.ctx, { customer: person(), kind: 'coil' });
		await tellWant(ours.ctx, `W${number}`, { by: 'phone' });
		const state = async () => (await getWant(ours.ctx, `W${number}`)).state;
		const days = (count: number) => later(count * 24 * 60).now;
		await quietWants(ours.ctx.db, ours.ctx.shopId, days(6));
		expect(await state()).toBe('told');
		await quietWants(ours.ctx.db, ours.ctx.shopId, days(7));
		expect(await state()).toBe('gone quiet');
		await waitOn(ours.ctx, `W${number}`);
		expect(await state()).toBe('waiting');
	});

	it('what was done is undone, the newest first; a closed want says so', async () => {
		const on = engine();
		const { tag } = await old(said(on));
		const { number } = await addWant(ours.ctx, { job: 'x', kind: 'recoil', engine: said(on) });
		const ref = `W${number}`;
		const yes = await sayYes(ours.ctx, ref, { part: tag });
		const closed = await closeWant(ours.ctx, ref);
		await expect(undoWant(ours.ctx, ref, yes.eventId)).rejects.toThrow('Something else');
		await expect(tellWant(ours.ctx, ref, { by: 'phone' })).rejects.toThrow('“got it” by now');
		await undoWant(ours.ctx, ref, closed.eventId);
		expect(await getWant(ours.ctx, ref)).toMatchObject({ state: 'said yes', kept: tag });
		expect((await getPart(ours.ctx, tag)).state).toBe('held');
		const off = await takeOffWant(ours.ctx, ref);
		expect((await getPart(ours.ctx, tag)).state).toBe('shelved');
		await undoWant(ours.ctx, ref, off.eventId);
		expect((await getWant(ours.ctx, ref)).state).toBe('said yes');
		const match = (await getWant(ours.ctx, ref)).found[0]!;
		const dropped = await dropMatch(ours.ctx, ref, match.id);
		expect((await getWant(ours.ctx, ref)).found).toEqual([]);
		await undoWant(ours.ctx, ref, dropped.eventId);
		expect((await getWant(ours.ctx, ref)).found).toHaveLength(1);
	});
});

describe('the list', () => {
	it('has those first for whom something new is here, page by page, and counts them', async () => {
		const { ours: shop, theirs: other } = await testShops();
		const add = (engineSaid: string, { ctx }: TestShop) =>
			addWant(ctx, { job: 'x', kind: 'recoil', engine: engineSaid });
		for (const name of ['Grauvik 1', 'Grauvik 2', 'Grauvik 3']) await add(name, shop);
		await add('Grauvik 1', other);
		const made = await logOldStock(shop.ctx, {
			kind: 'recoil',
			grade: 'usable',
			engine: 'Grauvik 1'
		});
		await came({ partId: made.id }, shop);
		const { items } = await listWants(shop.ctx, { shown: 'open' });
		expect(items.map(({ number, fresh }) => [number, fresh])).toEqual([
			[1, 1],
			[3, 0],
			[2, 0]
		]);
		const pages: number[] = [];
		let cursor: string | undefined;
		do {
			const page = await listWants(shop.ctx, { limit: 1, ...(cursor ? { cursor } : {}) });
			pages.push(...page.items.map(({ number }) => number));
			cursor = page.next ?? undefined;
		} while (cursor);
		expect(pages).toEqual([1, 3, 2]);
		expect(await countFresh(shop.ctx)).toBe(1);
		expect(await countFresh(other.ctx)).toBe(0);
		expect(await countWants(shop.ctx)).toEqual({ open: 3, quiet: 0, closed: 0 });
	});
});

it('a customer who is deleted waits no more, and the want says “a customer”', async () => {
	const { id } = await addCustomer(ours.ctx, person());
	const on = engine();
	const { tag } = await old(said(on));
	const { number, id: wantId } = await addWant(ours.ctx, {
		...{ customer: id, kind: 'recoil', engine: said(on), note: 'calls after six, Ida' }
	});
	await tellWant(ours.ctx, `W${number}`, { by: 'e-mail' });
	await sayYes(ours.ctx, `W${number}`, { part: tag });
	await eraseCustomer(ours.ctx, id);
	const { shopId, memberId, now } = ours.ctx;
	await forgetCustomer(ours.ctx.db, { shopId, memberId, customerId: id, at: now.toISOString() });
	const want = await getWant(ours.ctx, `W${number}`);
	expect(want).toMatchObject({ name: 'a customer', state: 'taken off', note: '', email: '' });
	expect((await getPart(ours.ctx, tag)).state).toBe('shelved');
	expect(await lettersOf(ours.ctx, wantId)).toMatchObject([{ to: '', text: '', state: 'failed' }]);
	expect(JSON.stringify([want, await getCustomer(ours.ctx, id)])).not.toMatch(/Ida|mail\.example/);
	await expect(addWant(ours.ctx, { customer: id, kind: 'coil' })).rejects.toThrow('not here');
});
