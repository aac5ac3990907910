import type { RequestEvent } from '@sveltejs/kit';
import type { Context } from '../context';
import { db } from '../db';
import { bearer } from '../http/origin';
import { keyHolder, shopsOf } from './shops';

const contextOf = (here: Pick<Context, 'shopId' | 'memberId' | 'role'>): Context => ({
	db: db(),
	shopId: here.shopId,
	memberId: here.memberId,
	role: here.role,
	now: new Date()
});

/** Who is it: a person with a session, or a script with a key; and which shop the address names. */
export async function identify(event: RequestEvent): Promise<void> {
	event.locals.db = db();
	event.locals.person = null;
	event.locals.ctx = null;
	event.locals.shops = [];
	const key = bearer(event.request);
	if (key) await identifyKey(event, key);
	else await identifyPerson(event);
}

async function identifyPerson(event: RequestEvent): Promise<void> {
	const user = (await event.locals.auth())?.user;
	if (!user?.id || !user.email) return;
	event.locals.person = { id: user.id, name: user.name ?? user.email, email: user.email };
	const shops = await shopsOf(db(), user.id);
	event.locals.shops = shops.map(({ slug, name, role }) => ({ slug, name, role }));
	const here = shops.find((shop) => shop.slug === event.params.shop?.toLowerCase());
	if (here) event.locals.ctx = contextOf(here);
}

async function identifyKey(event: RequestEvent, key: string): Promise<void> {
	const holder = await keyHolder(db(), key);
	if (holder && holder.slug === event.params.shop?.toLowerCase())
		event.locals.ctx = contextOf(holder);
}
