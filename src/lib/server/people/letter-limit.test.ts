import { expect, it } from 'vitest';
import { NOON, testDb } from '../../../../tests/support/shops';
import { mayWriteTo } from './letter-limit';
import { signInByPassword } from './sign-in';

let n = 0;
const address = () => `letters-${process.pid}-${++n}@mail.example`;
const later = (minutes: number) => new Date(NOON.getTime() + minutes * 60_000);

it('an address gets three sign-in letters an hour, however many are asked for at once', async () => {
	const [db, to] = [await testDb(), address()];
	const asked = await Promise.all(Array.from({ length: 20 }, () => mayWriteTo(db, to, NOON)));
	expect(asked.filter(Boolean)).toHaveLength(3);
	expect(await mayWriteTo(db, to, later(59))).toBe(false);
	expect(await mayWriteTo(db, address(), later(59))).toBe(true);
	expect(await mayWriteTo(db, to, later(60))).toBe(true);
});

it('is counted apart from wrong passwords, whatever is typed as an address', async () => {
	const [db, to] = [await testDb(), address()];
	for (let i = 0; i < 3; i++) await mayWriteTo(db, to, NOON);
	for (const email of [to, `LETTERS ${to}`])
		expect(await signInByPassword(db, { email, password: 'no' }, NOON)).toEqual({ wrong: true });
	expect(await mayWriteTo(db, to, later(1))).toBe(false);
});
