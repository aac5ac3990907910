import { getCustomer, listCustomers } from '$lib/server/customers';
import type { page } from '$lib/server/people';
import { getPart } from '$lib/server/parts';
import { asksOf, type AsksFor } from '$lib/wants/asks';

type Ctx = Parameters<Parameters<typeof page>[1]>[0];

/** What is known of it already: a search that ended in nothing, or a part that somebody else has. */
export async function asksFrom(ctx: Ctx, asked: URLSearchParams): Promise<AsksFor> {
	const tag = asked.get('part');
	if (!tag) return asksOf(asked.get('q') ?? '', asked.get('kind') ?? '');
	const { kind, engine, numbers } = await getPart(ctx, tag);
	return { kind, engine, measures: '', numbers };
}

/** Those offered first: the one whose page it came from, else the first of the list. */
export async function knownFirst(ctx: Ctx, asked: URLSearchParams) {
	const id = Number(asked.get('customer')) || null;
	if (id === null) return { known: (await listCustomers(ctx, { limit: 6 })).items, chosen: null };
	return { known: [await getCustomer(ctx, id)], chosen: id };
}
