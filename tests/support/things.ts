import { and, desc, eq } from 'drizzle-orm';
import { addBin, retireBin } from '../../src/lib/server/bins';
import { inShop, type Context } from '../../src/lib/server/context';
import { addCustomer, lettersAbout } from '../../src/lib/server/customers';
import { addWant, getWant, tellWant } from '../../src/lib/server/wants';
import { CustomerInput } from '../../src/lib/customers/input';
import { addKeptPhoto, askReading, getDonor, takeLabel } from '../../src/lib/server/donors';
import { hangPhoto, placePin, pullPart } from '../../src/lib/server/parts';
import { addKey, inviteMember, listInvites, listMembers } from '../../src/lib/server/people';
import { event } from '../../src/lib/server/people/tables';
import { putPrice, removePrice } from '../../src/lib/server/prices';
import { addScrapRun, addWaste } from '../../src/lib/server/yard';
import { ScrapRun, WasteEntry } from '../../src/lib/yard/input';
import { startWalk } from '../../src/lib/server/walks';
import { BinInput } from '../../src/lib/bins/input';
import { donorOnBench } from './bench';
import type { Refs } from './doors';
import type { TestShop } from './shops';

export const CANARY = 'canary-7Q9';

const PRICE = { kind: 'carb-float', newCents: 5000, source: CANARY, seenOn: '2026-03-01' };
const kept = () => ({ key: `1/${crypto.randomUUID()}`, width: 1, height: 1, bytes: 1, blur: '' });

const bin = (address: string) =>
	BinInput.parse({ address, size: 'm', purpose: CANARY, place: CANARY });

/** Somebody who waits for what is there, told of it by a letter. */
async function waiting(ctx: Context) {
	const email = `${CANARY.toLowerCase()}@mail.example`;
	const { id: customer } = await addCustomer(
		ctx,
		CustomerInput.parse({ name: CANARY, phone: `${CANARY} 555`, email, note: CANARY })
	);
	const words = { engine: CANARY, note: CANARY };
	const { id, number } = await addWant(ctx, { customer, kind: 'carb-float', ...words });
	const want = `W${number}`;
	const [match] = (await getWant(ctx, want)).found;
	const { eventId: wantEvent } = await tellWant(ctx, want, { by: 'e-mail' });
	const [letter] = await lettersAbout(ctx, 'want', [id]);
	return { customer, letter: letter!.id, want, wantMatch: match!.id, wantEvent };
}

/** One of each thing in a shop, with the canary in every text. Returns how each is named. */
export async function stock({ ctx }: TestShop): Promise<Refs> {
	const donor = await donorOnBench(ctx, { maker: CANARY, note: CANARY, offMachine: CANARY });
	const seen = await getDonor(ctx, donor);
	await addBin(ctx, bin(`${CANARY} 1`));
	const { tag: retiredBin } = await addBin(ctx, bin(`${CANARY} 2`));
	const { eventId: binEvent } = await retireBin(ctx, retiredBin);
	const words = { label: CANARY, note: CANARY, numbers: [CANARY], bin: `${CANARY} 1` };
	const part = await pullPart(ctx, donor, { kind: 'carb-float', grade: 'usable', ...words });
	const photo = await addKeptPhoto(ctx, donor, kept(), 'front');
	await hangPhoto(ctx, part.tag, kept());
	const pin = await placePin(ctx, donor, { photo: photo.id, x: 0.2, y: 0.2, part: part.tag });
	const plate = await addKeptPhoto(ctx, donor, kept(), 'label');
	const reading = await askReading(ctx, donor, plate.id);
	const serial = { reading: reading.id, fields: ['serial' as const], edit: { serial: CANARY } };
	const taken = await takeLabel(ctx, donor, serial);
	const loads = [{ scrapClass: 'Al-Fe', grams: 9000, cents: 300 }];
	const run = await addScrapRun(ctx, ScrapRun.parse({ buyer: CANARY, note: CANARY, loads }));
	const can = { what: 'used oil', way: 'in', millilitres: 600, note: CANARY };
	const waste = await addWaste(ctx, WasteEntry.parse(can));
	const price = await putPrice(ctx, { ...PRICE, engine: CANARY });
	const gone = await putPrice(ctx, { ...PRICE, number: CANARY });
	const priceEvent = await removePrice(ctx, gone.id, gone.version);
	await inviteMember(ctx, { email: `${CANARY.toLowerCase()}@mail.example`, role: 'bench' });
	await addKey(ctx, { name: CANARY, role: 'counter' });
	const members = await listMembers(ctx);
	const [newest] = await inShop(ctx, (tx) =>
		tx
			.select({ id: event.id })
			.from(event)
			.where(and(eq(event.shopId, ctx.shopId), eq(event.about, 'part')))
			.orderBy(desc(event.id))
			.limit(1)
	);
	return {
		donor: seen.boxes[0]!.tag,
		donorId: seen.id,
		part: part.tag,
		partId: part.id,
		bin: `${CANARY} 1`,
		retiredBin,
		price: price.id,
		photo: photo.id,
		member: ctx.memberId,
		invite: (await listInvites(ctx))[0]!.id,
		key: members.find((one) => one.keyId !== null)!.keyId!,
		partEvent: newest!.id,
		pin: pin.id,
		pinEvent: pin.eventId,
		priceEvent,
		binEvent,
		walk: (await startWalk(ctx, { what: 'count' })).id,
		scrapRun: run.number,
		waste: waste.id,
		reading: reading.id,
		takeEvent: taken.eventId,
		...(await waiting(ctx))
	};
}

/** Names that no shop has given to anything. */
export const NOTHING: Refs = {
	donor: 'D999999',
	donorId: 999_999_999,
	part: '0000A',
	partId: 999_999_999,
	bin: 'nowhere 9',
	retiredBin: '0000A',
	price: 999_999_999,
	photo: 999_999_999,
	member: 999_999_999,
	invite: 999_999_999,
	key: 999_999_999,
	partEvent: 999_999_999,
	pin: 999_999_999,
	pinEvent: 999_999_999,
	priceEvent: 999_999_999,
	binEvent: 999_999_999,
	walk: 999_999_999,
	scrapRun: 999_999_999,
	waste: 999_999_999,
	reading: 999_999_999,
	takeEvent: 999_999_999,
	customer: 999_999_999,
	letter: 999_999_999,
	want: 'W999999',
	wantMatch: 999_999_999,
	wantEvent: 999_999_999
};
