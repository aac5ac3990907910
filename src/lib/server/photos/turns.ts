/**
 * Lets works in while what they weigh together stays within the total; the rest wait. One that is heavier
 * than the total goes in alone, and a light one does not wait behind a heavy one that has no room yet.
 */
export function room(total: number): <T>(weight: number, work: () => Promise<T>) => Promise<T> {
	let taken = 0;
	let waiting: { weight: number; go: () => void }[] = [];
	const fits = (weight: number) => taken === 0 || taken + weight <= total;
	const admit = () => {
		waiting = waiting.filter(({ weight, go }) => {
			if (!fits(weight)) return true;
			taken += weight;
			go();
			return false;
		});
	};
	return async (weight, work) => {
		await new Promise<void>((go) => {
			waiting.push({ weight, go });
			admit();
		});
		try {
			return await work();
		} finally {
			taken -= weight;
			admit();
		}
	};
}

/** Lets so many works run at once; the rest wait their turn in order. */
export function turns(atOnce: number): <T>(work: () => Promise<T>) => Promise<T> {
	const enter = room(atOnce);
	return (work) => enter(1, work);
}
