/** What the work gives, or an error when it takes longer than so many milliseconds. */
export async function within<T>(limitMs: number, work: Promise<T>): Promise<T> {
	let bell: NodeJS.Timeout | undefined;
	const late = new Promise<never>((_, fail) => {
		bell = setTimeout(() => fail(new Error(`It took longer than ${limitMs} ms`)), limitMs);
	});
	try {
		return await Promise.race([work, late]);
	} finally {
		clearTimeout(bell);
	}
}
