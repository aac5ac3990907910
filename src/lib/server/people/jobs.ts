import { and, eq, lt, sql } from 'drizzle-orm';
import { inShop } from '../context';
import { db } from '../db';
import type { Task } from '../queue';
import { sendInviteLetter, type InviteLetter } from './letters/invite';
import { allShopIds } from './shops';
import { answered, session, verificationToken } from './tables';

/** As long as a phone may be away and send its changes again. */
const ANSWERS_KEPT_DAYS = 14;
const DAY_MS = 86_400_000;

async function forgetAnswers(shopId: number, now: Date): Promise<void> {
	const before = new Date(now.getTime() - ANSWERS_KEPT_DAYS * DAY_MS);
	const ctx = { db: db(), shopId, memberId: 0, role: 'owner' as const, now };
	await inShop(ctx, (tx) =>
		tx.delete(answered).where(and(eq(answered.shopId, shopId), lt(answered.at, before)))
	);
}

export const tasks: Task[] = [
	{ name: 'people.invite', run: (payload) => sendInviteLetter(payload as InviteLetter) },
	{
		name: 'people.sweep',
		cron: '17 * * * *',
		async run(_payload, now) {
			await db().delete(session).where(lt(session.expires, now));
			await db().delete(verificationToken).where(lt(verificationToken.expires, now));
			await db().execute(
				sql`delete from sign_in_try where wait_until < ${new Date(now.getTime() - DAY_MS)}`
			);
			for (const shopId of await allShopIds(db())) await forgetAnswers(shopId, now);
		}
	}
];
