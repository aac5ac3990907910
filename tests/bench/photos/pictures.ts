import type { Buffer } from 'node:buffer';
import { fileURLToPath } from 'node:url';
import sharp from 'sharp';

const box = fileURLToPath(new URL('../../../fixtures/photos/box.jpg', import.meta.url));
const [WIDTH, HEIGHT] = [4032, 3024];

/** The grain of a small sensor. */
const grain = (sigma: number) =>
	sharp({
		create: {
			...{ width: WIDTH, height: HEIGHT, channels: 3, background: '#808080' },
			noise: { type: 'gaussian', mean: 128, sigma }
		}
	})
		.jpeg({ quality: 95 })
		.toBuffer();

/** Photos of 12 megapixels with grain, each unlike the others, lying on their side as a phone writes them. */
export async function twelveMegapixels(count: number): Promise<Buffer[]> {
	const noise = await grain(34);
	const photos: Buffer[] = [];
	for (let at = 0; at < count; at += 1) {
		const scene = await sharp(box)
			.modulate({ hue: (at * 47) % 360, brightness: 0.85 + (at % 5) * 0.07 })
			.resize(WIDTH, HEIGHT, { fit: 'fill' })
			.toBuffer();
		photos.push(
			await sharp(scene)
				.composite([{ input: noise, blend: 'overlay' }])
				.withMetadata({ orientation: 6 })
				.jpeg({ quality: 90 })
				.toBuffer()
		);
	}
	return photos;
}
