/** Lets so many works run at once; the rest wait their turn in order. */
export function turns(atOnce: number): <T>(work: () => Promise<T>) => Promise<T> {
	let running = 0;
	const waiting: (() => void)[] = [];
	return async (work) => {
		if (running >= atOnce) await new Promise<void>((go) => waiting.push(go));
		else running += 1;
		try {
			return await work();
		} finally {
			const next = waiting.shift();
			if (next) next();
			else running -= 1;
		}
	};
}
