import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Db } from '../db';
import { env } from '../env';
import { sendLetter } from '../mail';
import { letterSettings } from './settings';
import { letter } from './tables';

export interface Sending {
	shopId: number;
	letterId: number;
	/** Of the link by which such letters are stopped; kept nowhere but in the letter. */
	token: string;
}

/** As often as the queue tries by itself. */
const MOST_TRIES = 10;

interface MailFault {
	responseCode?: number;
	response?: string;
	message?: string;
}

/** A mail server that says 5xx to the address will say it again. */
const isFinal = ({ responseCode }: MailFault) =>
	responseCode !== undefined && responseCode >= 550 && responseCode < 560;

const bottom = (link: string) => `
--
You get this because you asked us to tell you. No more such letters: ${link}
`;

async function note(ctx: Context, id: number, set: Partial<typeof letter.$inferInsert>) {
	await inShop(ctx, (tx) =>
		tx
			.update(letter)
			.set(set)
			.where(and(eq(letter.shopId, ctx.shopId), eq(letter.id, id), eq(letter.state, 'waiting')))
	);
}

/**
 * Sends a letter that waits. Run twice it is one letter: a sent one is left alone, and the same letter always has
 * the same Message-ID. While the mail server is away the queue tries again; what did not go in the end is marked.
 */
export async function sendWaiting(db: Db, job: Sending, now: Date): Promise<void> {
	const ctx: Context = { db, shopId: job.shopId, memberId: 0, role: 'counter', now };
	const [row] = await inShop(ctx, (tx) =>
		tx
			.select()
			.from(letter)
			.where(and(eq(letter.shopId, ctx.shopId), eq(letter.id, job.letterId)))
	);
	if (row?.state !== 'waiting') return;
	const { replyTo } = await letterSettings(ctx);
	const link = `${env().ORIGIN}/letters/${job.token}`;
	try {
		await sendLetter({
			...{ to: row.to, subject: row.subject, text: row.text + bottom(link) },
			...{ key: `letter-${row.shopId}-${row.id}`, unsubscribe: link },
			...(replyTo ? { replyTo } : {})
		});
	} catch (thrown) {
		const fault = thrown as MailFault;
		const tries = row.tries + 1;
		const over = tries >= MOST_TRIES || isFinal(fault);
		const said = (fault.response ?? fault.message ?? 'no answer').slice(0, 300);
		await note(ctx, row.id, { tries, fault: said, state: over ? 'failed' : 'waiting' });
		if (over) return;
		throw thrown;
	}
	await note(ctx, row.id, { state: 'sent', sentAt: now, tries: row.tries + 1, fault: '' });
}
