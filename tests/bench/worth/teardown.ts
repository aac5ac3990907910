import type { Family } from './market';

/** What has to come off before what, on one engine family, by place among its items. */
export interface Teardown {
	/** For each item: all that must come off to have it, itself included. */
	needs: readonly (readonly number[])[];
	pullMinutes: readonly number[];
	/** Place of the whole that it is a piece of, or -1. */
	whole: readonly number[];
}

const known = new WeakMap<Family, Teardown>();

function build({ items }: Family): Teardown {
	const placeOf = new Map(items.map(({ kind }, place) => [kind.id, place]));
	const behind = items.map(({ kind }) =>
		[...kind.behind, ...(kind.partOf ? [kind.partOf] : [])].flatMap((id) => placeOf.get(id) ?? [])
	);
	const needs = items.map((_, place) => {
		const found = new Set<number>();
		const collect = (at: number) => {
			if (found.has(at)) return;
			found.add(at);
			behind[at]?.forEach(collect);
		};
		collect(place);
		return [...found];
	});
	return {
		needs,
		pullMinutes: items.map(({ kind }) => kind.pullMinutes),
		whole: items.map(({ kind }) => placeOf.get(kind.partOf ?? '') ?? -1)
	};
}

export function teardown(family: Family): Teardown {
	const found = known.get(family) ?? build(family);
	known.set(family, found);
	return found;
}

/** Minutes to get all these off, what stands before them included. */
export function minutesFor(places: Iterable<number>, { needs, pullMinutes }: Teardown): number {
	const off = new Uint8Array(pullMinutes.length);
	let minutes = 0;
	for (const place of places)
		for (const need of needs[place] ?? []) {
			if (off[need]) continue;
			off[need] = 1;
			minutes += pullMinutes[need] ?? 0;
		}
	return minutes;
}

/** Without the pieces whose whole is kept. */
export function withoutPieces(places: readonly number[], { whole }: Teardown): number[] {
	const kept = new Set(places);
	const inside = (place: number): boolean => {
		const outer = whole[place] ?? -1;
		return outer >= 0 && (kept.has(outer) || inside(outer));
	};
	return places.filter((place) => !inside(place));
}
