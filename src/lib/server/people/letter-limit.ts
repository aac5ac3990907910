import { sql } from 'drizzle-orm';
import type { Db } from '../db';
import { signInTry } from './tables';

const AN_HOUR = 3;

/**
 * Counts one more sign-in letter for an address; false when it got its three of this hour. The row stands
 * beside the wrong tries, in capitals: a typed address is kept in lower case and never meets it.
 */
export async function mayWriteTo(db: Db, email: string, now: Date): Promise<boolean> {
	const hourAhead = new Date(now.getTime() + 3_600_000);
	const over = sql`${signInTry.waitUntil} <= ${now}`;
	const [row] = await db
		.insert(signInTry)
		.values({ email: `LETTERS ${email}`, failures: 1, waitUntil: hourAhead })
		.onConflictDoUpdate({
			target: signInTry.email,
			set: {
				failures: sql`case when ${over} then 1 else ${signInTry.failures} + 1 end`,
				waitUntil: sql`case when ${over} then ${hourAhead} else ${signInTry.waitUntil} end`
			}
		})
		.returning({ letters: signInTry.failures });
	return row!.letters <= AN_HOUR;
}
