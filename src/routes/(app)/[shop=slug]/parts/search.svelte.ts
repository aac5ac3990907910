import { browser } from '$app/environment';
import { searchOf, type Question } from '$lib/find/address';
import type { Found } from '$lib/find/view';
import { createQuery, keepPreviousData, QueryClient } from '@tanstack/svelte-query';

/** What the server answered with the page. */
interface Given {
	slug: string;
	question: Question;
	found: Found;
}

async function ask(slug: string, search: string, signal: AbortSignal): Promise<Found> {
	const together = /(^|&)(view=table|same=)/.test(search) ? 'no' : 'yes';
	const answer = await fetch(`/api/${slug}/parts?${search}&together=${together}`, { signal });
	if (!answer.ok) throw new Error(`${answer.status}`);
	return answer.json();
}

/**
 * The answer to a question that changes while it is typed. The last answer stays until the next is
 * here; each answer belongs to its question, so a late one never covers a newer.
 */
export function liveSearch(given: () => Given, question: () => Question) {
	const client = new QueryClient({
		defaultOptions: { queries: { staleTime: 15_000, retry: 1, refetchOnWindowFocus: false } }
	});
	const search = $derived(searchOf(question(), question()));
	const query = createQuery(
		() => ({
			queryKey: ['parts', given().slug, search],
			queryFn: ({ signal }: { signal: AbortSignal }) => ask(given().slug, search, signal),
			initialData:
				search === searchOf(given().question, given().question) ? given().found : undefined,
			placeholderData: keepPreviousData,
			enabled: browser
		}),
		() => client
	);
	return {
		get found(): Found {
			return query.data ?? given().found;
		},
		get waits(): boolean {
			return query.isFetching;
		},
		get failed(): boolean {
			return query.isError && !query.isFetching;
		},
		again: () => void query.refetch()
	};
}
