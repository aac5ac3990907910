import type { KindStillOn } from '$lib/parts/view';
import { checklist } from '$lib/trade';

/** A kind that is still on the donor, as a photo of it asks. */
export interface BoxKind {
	kind: string;
	kindName: string;
	/** Why it is not logged together with others; null where it can be. */
	alone: string | null;
}

/** The kinds still on a donor, the most worthwhile first. */
export const boxKinds = (kinds: readonly KindStillOn[]): BoxKind[] =>
	kinds.map(({ kind, kindName, never }) => ({
		kind,
		kindName,
		alone: never ?? (checklist(kind).length > 0 ? 'Has a checklist: log it by itself.' : null)
	}));
