import { Refused } from '$lib/refusal';
import { findStray, getWalk } from '$lib/server/walks';
import type { Stray } from '$lib/walks/view';

interface Event {
	params: { shop: string; walk: string };
	url: URL;
}
type Ctx = Parameters<typeof getWalk>[0];

/** What was scanned at this place, or why it cannot be put right. */
export async function scanned(ctx: Ctx, id: number, place: number, code: string) {
	const looked: { code: string; stray: Stray | null; problem: string | null } = {
		...{ code, stray: null, problem: null }
	};
	try {
		return { ...looked, stray: await findStray(ctx, id, place, code) };
	} catch (thrown) {
		if (!(thrown instanceof Refused)) throw thrown;
		return { ...looked, problem: thrown.message };
	}
}

/** A walk at the place that is asked for; once everything there is answered, at the next. */
export async function walkAt(ctx: Ctx, id: number, query: URLSearchParams) {
	const at = query.get('at');
	const asked = await getWalk(ctx, id, at === null ? undefined : Number(at));
	return query.has('said') && asked.at?.open === 0 ? getWalk(ctx, id) : asked;
}

/** On with the walk: the same place while something is open there. */
export function on({ params, url }: Event, said: string, last?: number) {
	const query = new URLSearchParams({ said });
	const at = url.searchParams.get('at');
	if (at !== null) query.set('at', at);
	if (last !== undefined) query.set('last', String(last));
	return { to: `/${params.shop}/walks/${params.walk}?${query}` };
}
export const idOf = ({ params }: Event) => Number(params.walk);
