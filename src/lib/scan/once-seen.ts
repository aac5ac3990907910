/** So long a code must have been out of sight before it counts as scanned again, in ms. */
export const OUT_OF_SIGHT = 1500;

/** Says of each sight of a code whether it is a new scan: what stays before the camera counts once. */
export function onceSeen(): (text: string, now: number) => boolean {
	const seen = new Map<string, number>();
	return (text, now) => {
		const last = seen.get(text);
		for (const [other, at] of seen) if (now - at > OUT_OF_SIGHT) seen.delete(other);
		seen.set(text, now);
		return last === undefined || now - last > OUT_OF_SIGHT;
	};
}
