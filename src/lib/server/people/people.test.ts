import { and, eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { NOON, testDb, testShops } from '../../../../tests/support/shops';
import { inShop } from '../context';
import { acceptInvite, findInvite } from './accept-invite';
import { inviteMember } from './invites';
import { addKey, revokeKey } from './keys';
import { editMember, listInvites, listMembers } from './members';
import { fingerprint, once } from './once';
import { editPolicy, editShop, getPolicy, getPolicyRow, getShop } from './settings';
import { keyHolder, shopsOf } from './shops';
import { signInByPassword } from './sign-in';
import { setPassword } from './persons';
import { signUp } from './sign-up';
import { answered, event, person } from './tables';
import { newToken, tokenHash } from './hash';
import { invite } from './tables';

const LATER = (seconds: number) => new Date(NOON.getTime() + seconds * 1000);
let n = 0;
const address = () => `person-${process.pid}-${++n}@mail.example`;

async function newPerson(password = 'seven blue wheelbarrows') {
	const email = address();
	const input = {
		shopName: 'Alderholt Mowers',
		yourName: 'Jory Penhale',
		currency: 'EUR',
		timeZone: 'UTC',
		units: 'mm' as const
	};
	const db = await testDb();
	const { slug } = await signUp(db, { ...input, email, password }, NOON);
	const [row] = await db.select().from(person).where(eq(person.email, email));
	return { db, email, password, slug, id: row!.id };
}

describe('opening a shop', () => {
	it('makes the owner, a slug of its own and the first event', async () => {
		const a = await newPerson();
		const b = await newPerson();
		expect(a.slug).not.toBe(b.slug);
		const [shop] = await shopsOf(a.db, a.id);
		expect(shop).toMatchObject({ slug: a.slug, role: 'owner', name: 'Alderholt Mowers' });
	});
	it('refuses a short password and the name of the shop, and an address that is taken', async () => {
		await expect(newPerson('fourteen chars')).rejects.toThrow('15 characters');
		await expect(newPerson('Alderholt Mowers')).rejects.toThrow('name or address');
		const { db, email, password } = await newPerson();
		const again = {
			shopName: 'X',
			yourName: 'Y',
			email,
			password,
			currency: 'EUR',
			timeZone: 'UTC',
			units: 'mm' as const
		};
		await expect(signUp(db, again, NOON)).rejects.toMatchObject({ code: 'taken', field: 'email' });
	});
	it('keeps an argon2id hash of the strength of the sheet', async () => {
		const { db, id } = await newPerson();
		const { rows } = await db.execute<{ hash: string }>(
			`select hash from password_hash where person_id = '${id}'`
		);
		expect(rows[0]!.hash).toMatch(/^\$argon2id\$v=19\$m=65536,t=3,p=1\$/);
	});
});

describe('signing in', () => {
	it('takes the right password in any case of the address, and no other', async () => {
		const { db, email, password, id } = await newPerson();
		expect(
			await signInByPassword(db, { email: email.toUpperCase(), password }, NOON)
		).toMatchObject({ who: { id } });
		expect(await signInByPassword(db, { email, password: 'seven blue wheelbarrow' }, NOON)).toEqual(
			{ wrong: true }
		);
	});
	it('makes the sixth wrong try in a row wait, longer each time, for unknown addresses alike', async () => {
		for (const email of [(await newPerson()).email, address()]) {
			const db = await testDb();
			for (let i = 0; i < 5; i++)
				expect(await signInByPassword(db, { email, password: 'no' }, NOON)).toEqual({
					wrong: true
				});
			expect(await signInByPassword(db, { email, password: 'no' }, NOON)).toEqual({
				waitSeconds: 1
			});
			expect(await signInByPassword(db, { email, password: 'no' }, LATER(1))).toEqual({
				wrong: true
			});
			expect(await signInByPassword(db, { email, password: 'no' }, LATER(1))).toEqual({
				waitSeconds: 2
			});
		}
	});
	it('counts tries that come at once', async () => {
		const { db, email } = await newPerson();
		const tries = await Promise.all(
			Array.from({ length: 20 }, () => signInByPassword(db, { email, password: 'no' }, NOON))
		);
		expect(tries.filter((one) => 'wrong' in one)).toHaveLength(5);
	});
	it('opens again with the right password after the wait, and forgets the tries', async () => {
		const { db, email, password } = await newPerson();
		for (let i = 0; i < 5; i++) await signInByPassword(db, { email, password: 'no' }, NOON);
		expect(await signInByPassword(db, { email, password }, LATER(2))).toHaveProperty('who');
		expect(await signInByPassword(db, { email, password: 'no' }, LATER(2))).toEqual({
			wrong: true
		});
	});
	it('with a new password, no older session is left', async () => {
		const { db, id, email } = await newPerson();
		await db.execute(
			`insert into session (session_token, user_id, expires) values ('t-${id}', '${id}', now() + interval '1 day')`
		);
		await setPassword(db, id, 'a very different phrase', NOON);
		const { rows } = await db.execute(`select 1 from session where user_id = '${id}'`);
		expect(rows).toHaveLength(0);
		expect(
			await signInByPassword(db, { email, password: 'a very different phrase' }, NOON)
		).toHaveProperty('who');
	});
});

describe('members', () => {
	it('shut out are gone from the list of shops at once', async () => {
		const { ours } = await testShops();
		const bench = await ours.as('bench');
		const [, row] = (await listMembers(ours.ctx)).sort((a, b) => a.id - b.id);
		await editMember(ours.ctx, {
			memberId: bench.memberId,
			version: row!.version,
			disabled: 'yes'
		});
		expect((await listMembers(ours.ctx)).find((one) => one.id === bench.memberId)?.disabled).toBe(
			true
		);
	});
	it('of another shop are not seen and cannot be changed', async () => {
		const { ours, theirs } = await testShops();
		const stranger = theirs.ctx.memberId;
		expect((await listMembers(ours.ctx)).map((one) => one.id)).not.toContain(stranger);
		await expect(
			editMember(ours.ctx, { memberId: stranger, version: 1, role: 'reader' })
		).rejects.toMatchObject({ name: 'NotFound' });
	});
	it('leave the shop an owner', async () => {
		const { ours } = await testShops();
		await expect(
			editMember(ours.ctx, { memberId: ours.ctx.memberId, version: 1, role: 'bench' })
		).rejects.toThrow('needs an owner');
	});
});

describe('invitations', () => {
	async function invited(role: 'bench' | 'counter') {
		const { ours } = await testShops();
		const email = address();
		await inviteMember(ours.ctx, { email, role });
		const token = newToken();
		await inShop(ours.ctx, (tx) =>
			tx
				.update(invite)
				.set({ tokenHash: tokenHash(token) })
				.where(and(eq(invite.shopId, ours.ctx.shopId), eq(invite.email, email)))
		);
		return { ours, email, token };
	}
	it('let one person in once, with the role of the invitation', async () => {
		const { ours, token, email } = await invited('bench');
		const db = ours.ctx.db;
		expect(await findInvite(db, token, NOON)).toMatchObject({ email, role: 'bench', known: false });
		const as = { yourName: 'Tamsin Rowe', password: 'under the long shelf' };
		const tries = await Promise.allSettled([
			acceptInvite(db, token, as, NOON),
			acceptInvite(db, token, as, NOON)
		]);
		expect(tries.filter((one) => one.status === 'fulfilled')).toHaveLength(1);
		expect((await listMembers(ours.ctx)).find((one) => one.email === email)?.role).toBe('bench');
		await expect(findInvite(db, token, NOON)).rejects.toThrow('used');
	});
	it('close after seven days and open to nobody else', async () => {
		const { ours, token } = await invited('counter');
		await expect(findInvite(ours.ctx.db, token, LATER(8 * 86_400))).rejects.toThrow('seven days');
		const other = await newPerson();
		await expect(
			acceptInvite(
				ours.ctx.db,
				token,
				{ personId: other.id, email: other.email, yourName: 'No' },
				NOON
			)
		).rejects.toThrow('This invitation is for');
		await expect(findInvite(ours.ctx.db, 'made-up', NOON)).rejects.toMatchObject({
			name: 'NotFound'
		});
	});
	it('of another shop stay unseen', async () => {
		const { ours } = await invited('bench');
		const { theirs } = await testShops();
		expect(await listInvites(ours.ctx)).toHaveLength(1);
		expect(await listInvites(theirs.ctx)).toHaveLength(0);
	});
});

describe('a key for scripts', () => {
	it('opens its own shop with its role until it is switched off', async () => {
		const { ours } = await testShops();
		const { key } = await addKey(ours.ctx, { name: 'price loader', role: 'counter' });
		expect(await keyHolder(ours.ctx.db, key)).toMatchObject({ slug: ours.slug, role: 'counter' });
		const row = (await listMembers(ours.ctx)).find((one) => one.name === 'price loader');
		await revokeKey(ours.ctx, row!.keyId!);
		expect(await keyHolder(ours.ctx.db, key)).toBeNull();
	});
});

describe('a change with a key', () => {
	it('is done once, however often and at whatever time it is sent', async () => {
		const { ours } = await testShops();
		let done = 0;
		const send = () =>
			once(ours.ctx, 'key-0001', fingerprint('here', { a: 1 }), async () => ({ made: ++done }));
		const answers = await Promise.all(Array.from({ length: 12 }, send));
		expect(new Set(answers.map((one) => one.made))).toEqual(new Set([1]));
		expect(done).toBe(1);
	});
	it('is refused for another body, and free again when the change was refused', async () => {
		const { ours } = await testShops();
		await once(ours.ctx, 'key-0002', fingerprint('here', 1), async () => 1);
		await expect(
			once(ours.ctx, 'key-0002', fingerprint('here', 2), async () => 2)
		).rejects.toMatchObject({ code: 'key reused' });
		await expect(
			once(ours.ctx, 'key-0003', 'h', async () => Promise.reject(new Error('no')))
		).rejects.toThrow('no');
		expect(await once(ours.ctx, 'key-0003', 'h', async () => 'yes')).toBe('yes');
		const rows = await inShop(ours.ctx, (tx) =>
			tx.select().from(answered).where(eq(answered.shopId, ours.ctx.shopId))
		);
		expect(rows).toHaveLength(2);
	});
});

describe('settings and policy', () => {
	it('refuse the second of two editors and say what is saved', async () => {
		const { ours } = await testShops();
		const { slug: _slug, ...shop } = await getShop(ours.ctx);
		await editShop(ours.ctx, { ...shop, season: 'rush' });
		await expect(editShop(ours.ctx, { ...shop, season: 'slow' })).rejects.toThrow(
			'the season rush'
		);
	});
	it('keep the own figures over the defaults and put a figure back to its default', async () => {
		const { ours, theirs } = await testShops();
		await editPolicy(ours.ctx, { own: { copyCap: 0.7 }, version: 0 });
		expect((await getPolicy(ours.ctx)).copyCap).toBe(0.7);
		expect((await getPolicy(theirs.ctx)).copyCap).toBe(0.8);
		await expect(editPolicy(ours.ctx, { own: {}, version: 0 })).rejects.toMatchObject({
			code: 'changed'
		});
		await editPolicy(ours.ctx, { own: {}, version: 1 });
		expect(await getPolicyRow(ours.ctx)).toMatchObject({
			own: {},
			version: 2,
			policy: { copyCap: 0.8 }
		});
		const events = await inShop(ours.ctx, (tx) =>
			tx
				.select()
				.from(event)
				.where(and(eq(event.shopId, ours.ctx.shopId), eq(event.what, 'policy')))
		);
		expect(events).toHaveLength(2);
	});
});
