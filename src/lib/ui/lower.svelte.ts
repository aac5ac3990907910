import { getContext, setContext, type Snippet } from 'svelte';

/** What the page of the moment puts into the thumb zone, above the places. */
export class LowerSlot {
	snippet = $state.raw<Snippet | undefined>();
	// Not state: while a page is taken down, state still reads as it was before the next page came.
	#owner: Snippet | undefined;

	take(snippet: Snippet) {
		this.#owner = snippet;
		this.snippet = snippet;
	}

	leave(snippet: Snippet) {
		if (this.#owner !== snippet) return;
		this.#owner = undefined;
		this.snippet = undefined;
	}
}

const KEY = Symbol('lower');

export const provideLower = () => setContext(KEY, new LowerSlot());
export const lowerSlot = () => getContext<LowerSlot>(KEY);
