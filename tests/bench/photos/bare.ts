import type { Buffer } from 'node:buffer';
import sharp from 'sharp';

sharp.cache(false);

/** The work on one photo and nothing round it: three sizes and the tiny one, as the shop makes them. */
export async function bare(bytes: Buffer): Promise<void> {
	const inside = { fit: 'inside', withoutEnlargement: true } as const;
	const full = await sharp(bytes)
		.autoOrient()
		.resize(2048, 2048, inside)
		.webp({ quality: 80, effort: 2 })
		.toBuffer();
	const card = await sharp(full).resize(640, 640, inside).webp({ quality: 75 }).toBuffer();
	let thumb = card;
	for (const quality of [70, 45, 20]) {
		thumb = await sharp(card).resize(200, 200, inside).webp({ quality }).toBuffer();
		if (thumb.length <= 15 * 1024) break;
	}
	await sharp(thumb).resize(16, 16, inside).webp({ quality: 25, alphaQuality: 0 }).toBuffer();
}

/** Works through all of them, two at a time. Returns ms per photo. */
export async function twoAtATime<T>(all: readonly T[], work: (one: T) => Promise<unknown>) {
	const began = performance.now();
	const left = [...all];
	const hand = async () => {
		for (let one = left.shift(); one !== undefined; one = left.shift()) await work(one);
	};
	await Promise.all([hand(), hand()]);
	return (performance.now() - began) / all.length;
}

export const median = (figures: number[]): number =>
	figures.toSorted((a, b) => a - b)[Math.floor(figures.length / 2)] ?? 0;
