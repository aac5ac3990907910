import { getContext, setContext, type Snippet } from 'svelte';

/** What the page of the moment puts into the thumb zone, above the places. */
export class LowerSlot {
	snippet = $state.raw<Snippet | undefined>();
}

const KEY = Symbol('lower');

export const provideLower = () => setContext(KEY, new LowerSlot());
export const lowerSlot = () => getContext<LowerSlot>(KEY);
