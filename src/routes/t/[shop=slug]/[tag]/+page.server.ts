import { NotFound } from '$lib/refusal';
import { strangerWaits, tagOwner } from '$lib/server/tags';
import { error, redirect } from '@sveltejs/kit';
import { opens } from '../../opens';
import type { PageServerLoad } from './$types';

/**
 * Open to whoever scans a tag. A member is led to the thing; anybody else learns whose the tag is where the shop
 * wants that, and never what it hangs on.
 */
export const load: PageServerLoad = async (event) => {
	const { ctx, db, person } = event.locals;
	const { shop, tag } = event.params;
	if (ctx) {
		const path = await opens(ctx, shop, tag).catch((fault: unknown) => {
			if (fault instanceof NotFound) error(404, fault.message);
			throw fault;
		});
		redirect(303, path);
	}
	const seconds = await strangerWaits(db, event.getClientAddress(), new Date());
	if (seconds > 0) {
		event.setHeaders({ 'retry-after': String(seconds) });
		error(429, `So many tags were scanned from here. Wait ${seconds} seconds, then scan again.`);
	}
	event.setHeaders({ 'cache-control': 'no-store' });
	return {
		owner: await tagOwner(db, shop, tag),
		signedIn: person !== null,
		to: `/t/${shop}/${tag}`
	};
};
