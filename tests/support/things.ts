import { and, desc, eq } from 'drizzle-orm';
import { addBin, retireBin } from '../../src/lib/server/bins';
import { inShop } from '../../src/lib/server/context';
import { addKeptPhoto, getDonor } from '../../src/lib/server/donors';
import { hangPhoto, pullPart } from '../../src/lib/server/parts';
import { addKey, inviteMember, listInvites, listMembers } from '../../src/lib/server/people';
import { event } from '../../src/lib/server/people/tables';
import { putPrice, removePrice } from '../../src/lib/server/prices';
import { BinInput } from '../../src/lib/bins/input';
import { donorOnBench } from './bench';
import type { Refs } from './doors';
import type { TestShop } from './shops';

export const CANARY = 'canary-7Q9';

const PRICE = { kind: 'carb-float', newCents: 5000, source: CANARY, seenOn: '2026-03-01' };
const kept = () => ({ key: `1/${crypto.randomUUID()}`, width: 1, height: 1, bytes: 1 });

const bin = (address: string) =>
	BinInput.parse({ address, size: 'm', purpose: CANARY, place: CANARY });

/** One of each thing in a shop, with the canary in every text. Returns how each is named. */
export async function stock({ ctx }: TestShop): Promise<Refs> {
	const donor = await donorOnBench(ctx, { maker: CANARY, note: CANARY, offMachine: CANARY });
	const seen = await getDonor(ctx, donor);
	await addBin(ctx, bin(`${CANARY} 1`));
	const { tag: retiredBin } = await addBin(ctx, bin(`${CANARY} 2`));
	await retireBin(ctx, retiredBin);
	const words = { label: CANARY, note: CANARY, numbers: [CANARY], bin: `${CANARY} 1` };
	const part = await pullPart(ctx, donor, { kind: 'carb-float', grade: 'usable', ...words });
	const photo = await addKeptPhoto(ctx, donor, kept(), 'front');
	await hangPhoto(ctx, part.tag, kept());
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
		priceEvent
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
	priceEvent: 999_999_999
};
