import type { Template } from '$lib/customers/templates';
import type { LetterView } from '$lib/customers/view';
import { NotFound, Refused } from '$lib/refusal';
import { and, desc, eq, inArray } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, newToken, record, tokenHash } from '../people';
import { member } from '../people/tables';
import { enqueue } from '../queue/enqueue';
import { letter } from './tables';
import type { CustomerRow } from './queries';

export interface NewLetter extends Template {
	to: Pick<CustomerRow, 'id' | 'email'>;
	/** What it is about: a want, an offer. */
	about: string;
	aboutId: number;
}

/** Writes a letter to a customer inside the transaction of what it tells: roll back, and it never was. */
export async function writeLetter(tx: Tx, ctx: Context, about: NewLetter): Promise<number> {
	const token = newToken();
	const { to, subject, text, ...rest } = about;
	const [row] = await tx
		.insert(letter)
		.values({
			...{ shopId: ctx.shopId, customerId: to.id, to: to.email, subject, text },
			...{ about: rest.about, aboutId: rest.aboutId, memberId: ctx.memberId },
			...{ tokenHash: tokenHash(token), state: 'waiting', writtenAt: ctx.now }
		})
		.returning({ id: letter.id });
	await enqueue(tx, 'customers.letter', { shopId: ctx.shopId, letterId: row!.id, token });
	return row!.id;
}

/** Sends a letter that did not go once more; its link to stop letters is a new one. */
export const sendAgain = (ctx: Context, id: number): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const mine = and(eq(letter.shopId, ctx.shopId), eq(letter.id, id));
		const [row] = await tx.select().from(letter).where(mine).for('no key update');
		if (!row) throw new NotFound();
		if (row.state !== 'failed' || row.to === '')
			throw new Refused('gate', 'Only a letter that did not go can be sent again.');
		const token = newToken();
		const fresh = { state: 'waiting', tries: 0, fault: '', tokenHash: tokenHash(token) } as const;
		await tx.update(letter).set(fresh).where(mine);
		await record(tx, ctx, {
			about: 'customer',
			aboutId: row.customerId,
			what: 'letter sent again'
		});
		await enqueue(tx, 'customers.letter', { shopId: ctx.shopId, letterId: id, token });
	});

const { id, about, aboutId, to, subject, text, state, tries, fault, writtenAt, sentAt } = letter;
const shown = {
	...{ id, about, aboutId, to, subject, text, state, tries, fault, writtenAt, sentAt },
	by: member.name
};

const letters = (tx: Tx, which: ReturnType<typeof and>) =>
	tx
		.select(shown)
		.from(letter)
		.innerJoin(member, and(eq(member.shopId, letter.shopId), eq(member.id, letter.memberId)))
		.where(which)
		.orderBy(desc(letter.id));

export const lettersTo = (tx: Tx, ctx: Context, customerId: number): Promise<LetterView[]> =>
	letters(tx, and(eq(letter.shopId, ctx.shopId), eq(letter.customerId, customerId))).limit(50);

/** The letters about these things, newest first. */
export const lettersAbout = (
	ctx: Context,
	what: string,
	ids: readonly number[]
): Promise<LetterView[]> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const these = inArray(letter.aboutId, [...ids]);
		return letters(tx, and(eq(letter.shopId, ctx.shopId), eq(letter.about, what), these)).limit(
			500
		);
	});
