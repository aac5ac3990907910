import type { Context } from '$lib/server/context';
import { listReadings, todayIn } from '$lib/server/donors';

/** What the donor's page says of its plate. */
export async function plateOf(ctx: Context, ref: string, url: URL) {
	const [newest] = await listReadings(ctx, ref);
	const { id, state, offers } = newest ?? {};
	return {
		thisYear: Number((await todayIn(ctx)).slice(0, 4)),
		taken: url.searchParams.get('plate'),
		reading: id && state ? { id, state, found: offers?.length ?? 0 } : null
	};
}
