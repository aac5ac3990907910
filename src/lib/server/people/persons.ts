import { passwordFault } from '$lib/people/password';
import { Refused } from '$lib/refusal';
import { eq, sql } from 'drizzle-orm';
import type { Db, Tx } from '../db';
import { hashPassword } from './hash';
import { passwordHash, person } from './tables';

/** Makes a person with a password; refused in words when the address or the password will not do. */
export async function addPerson(
	tx: Tx,
	input: { name: string; email: string; password: string },
	known: string[],
	now: Date
): Promise<string> {
	const fault = passwordFault(input.password, [...known, input.name, input.email]);
	if (fault) throw new Refused('bad input', fault, 'password');
	const hash = await hashPassword(input.password);
	const [row] = await tx
		.insert(person)
		.values({ name: input.name, email: input.email })
		.onConflictDoNothing()
		.returning({ id: person.id });
	if (!row)
		throw new Refused(
			'taken',
			'Somebody signs in with this address already. Sign in, or ask for a sign-in link.',
			'email'
		);
	await tx.insert(passwordHash).values({ personId: row.id, hash, changedAt: now });
	return row.id;
}

/** Sets a new password and signs out every device of the person. */
export const setPassword = (db: Db, personId: string, password: string, now: Date): Promise<void> =>
	db.transaction(async (tx) => {
		const [who] = await tx.select().from(person).where(eq(person.id, personId));
		const fault = passwordFault(password, [who?.name ?? '', who?.email ?? '']);
		if (fault) throw new Refused('bad input', fault, 'password');
		const row = { hash: await hashPassword(password), changedAt: now };
		await tx
			.insert(passwordHash)
			.values({ personId, ...row })
			.onConflictDoUpdate({ target: passwordHash.personId, set: row });
		await tx.execute(sql`delete from session where user_id = ${personId}`);
	});
