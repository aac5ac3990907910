import { sql } from 'drizzle-orm';
import { expect, it } from 'vitest';
import { testDb } from '../../../tests/support/shops';
import { faultSaid, unnamed } from './log';

it('a failed query is logged by its text, never with what it carried', async () => {
	const db = await testDb();
	const secret = 'canary@mail.example';
	const query = db.execute(
		sql`insert into person (id, email) values ('x', ${secret.toUpperCase()})`
	);
	const said = faultSaid(await query.catch((fault: unknown) => fault));
	expect(JSON.stringify(said)).not.toMatch(/canary/i);
	expect(said).toMatchObject({ fault: expect.stringContaining('insert into person') });
	expect(said.cause).toMatchObject({ code: '23514', constraint: 'person_email_lower' });
});

it('the words of others are logged without the addresses in them', () => {
	const said = faultSaid(new Error('all recipients were rejected: <tamsin@mail.example>'));
	expect(said.fault).toBe('Error: all recipients were rejected: <(address)>');
	expect(unnamed('at node_modules/@sveltejs/kit/index.js:3:1')).toContain('@sveltejs/kit');
	expect(faultSaid('thrown text with a secret')).toEqual({ fault: 'not an error' });
});
