import { eq, sql } from 'drizzle-orm';
import type { Db } from '../db';
import { passwordFits } from './hash';
import { passwordHash, person, signInTry } from './tables';

const FREE_TRIES = 5;
const LONGEST_WAIT_SECONDS = 15 * 60;
/** So many wrong tries in a row close the password door; a sign-in link still opens. */
const HARD_STOP = 100;

export type SignInAnswer =
	| { who: { id: string; name: string | null; email: string } }
	| { wrong: true }
	| { waitSeconds: number };

const waitAfter = (failures: number) =>
	failures < FREE_TRIES ? 0 : Math.min(2 ** (failures - FREE_TRIES), LONGEST_WAIT_SECONDS);

/** Counts one wrong try before looking, so that tries sent at the same time each count. */
async function countTry(db: Db, email: string, now: Date) {
	return db.transaction(async (tx) => {
		await tx.insert(signInTry).values({ email, failures: 0, waitUntil: now }).onConflictDoNothing();
		const [row] = await tx
			.select()
			.from(signInTry)
			.where(eq(signInTry.email, email))
			.for('no key update');
		const stopped = row!.failures >= HARD_STOP;
		const left = stopped ? LONGEST_WAIT_SECONDS : (row!.waitUntil.getTime() - now.getTime()) / 1000;
		if (left > 0) return Math.ceil(left);
		const failures = row!.failures + 1;
		const waitUntil = new Date(now.getTime() + waitAfter(failures) * 1000);
		await tx.update(signInTry).set({ failures, waitUntil }).where(eq(signInTry.email, email));
		return 0;
	});
}

/** Checks an address and password; the answer and its time are the same for unknown addresses. */
export async function signInByPassword(
	db: Db,
	typed: { email: string; password: string },
	now: Date
): Promise<SignInAnswer> {
	const email = typed.email.trim().toLowerCase();
	const waitSeconds = await countTry(db, email, now);
	if (waitSeconds > 0) return { waitSeconds };
	const [row] = await db
		.select({ id: person.id, name: person.name, email: person.email, hash: passwordHash.hash })
		.from(person)
		.leftJoin(passwordHash, eq(passwordHash.personId, person.id))
		.where(eq(person.email, email));
	const fits = await passwordFits(row?.hash ?? undefined, typed.password);
	if (!row || !fits) return { wrong: true };
	await clearTries(db, email);
	return { who: { id: row.id, name: row.name, email: row.email } };
}

export async function clearTries(db: Db, email: string): Promise<void> {
	await db.delete(signInTry).where(eq(signInTry.email, email));
}

export async function knowsEmail(db: Db, email: string): Promise<boolean> {
	const rows = await db
		.select({ one: sql`1` })
		.from(person)
		.where(eq(person.email, email.trim().toLowerCase()));
	return rows.length > 0;
}
