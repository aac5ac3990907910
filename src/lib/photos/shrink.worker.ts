import { inside, QUALITIES, SENT_BYTES, SENT_SIDE, THUMB_SIDE } from './shrink-size';

export interface Asked {
	id: number;
	file: Blob;
	/** Only the thumb is wanted: the file goes as it is. */
	whole: boolean;
}
/** First the thumb, then the body; a body of null says that the file itself is to be sent. */
export type Told = { id: number; thumb: Blob } | { id: number; body: Blob | null };

const tell = (told: Told) => self.postMessage(told);

function drawn(bitmap: ImageBitmap, side: number): OffscreenCanvas {
	const { width, height } = inside(bitmap.width, bitmap.height, side);
	const canvas = new OffscreenCanvas(width, height);
	const pen = canvas.getContext('2d', { alpha: false });
	if (!pen) throw new Error('This browser draws no pictures in a worker');
	pen.fillStyle = '#fff';
	pen.fillRect(0, 0, width, height);
	pen.imageSmoothingQuality = 'high';
	pen.drawImage(bitmap, 0, 0, width, height);
	return canvas;
}

/** WebP where the browser writes it, else JPEG. */
async function packed(canvas: OffscreenCanvas, quality: number): Promise<Blob> {
	const webp = await canvas.convertToBlob({ type: 'image/webp', quality });
	if (webp.type === 'image/webp') return webp;
	return canvas.convertToBlob({ type: 'image/jpeg', quality });
}

async function small(bitmap: ImageBitmap): Promise<Blob> {
	const canvas = drawn(bitmap, SENT_SIDE);
	let body = await packed(canvas, QUALITIES[0]);
	for (const quality of QUALITIES.slice(1)) {
		if (body.size <= SENT_BYTES) break;
		body = await packed(canvas, quality);
	}
	return body;
}

async function work({ id, file, whole }: Asked): Promise<void> {
	// Turned as the camera lay: the canvas has no other memory of it.
	const bitmap = await createImageBitmap(file, { imageOrientation: 'from-image' });
	const thumb = drawn(bitmap, THUMB_SIDE);
	tell({ id, thumb: await thumb.convertToBlob({ type: 'image/jpeg', quality: 0.7 }) });
	const fits = Math.max(bitmap.width, bitmap.height) <= SENT_SIDE;
	const body = whole ? null : await small(bitmap);
	bitmap.close();
	tell({ id, body: body && fits && file.size <= body.size ? null : body });
}

self.onmessage = ({ data }: MessageEvent<Asked>) => {
	work(data).catch(() => tell({ id: data.id, body: null }));
};
