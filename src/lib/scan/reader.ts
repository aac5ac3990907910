import type { Sight } from './central';

/** Finds codes in what the camera shows. */
export type Reader = (video: HTMLVideoElement) => Promise<Sight[]>;

interface Found {
	rawValue: string;
	boundingBox: DOMRectReadOnly;
}
interface Detector {
	detect(source: HTMLVideoElement): Promise<Found[]>;
}
interface DetectorClass {
	new (options: { formats: string[] }): Detector;
	getSupportedFormats(): Promise<string[]>;
}

/** The reader of the platform, where there is one that knows our codes. */
async function platformReader(): Promise<Reader | null> {
	const { BarcodeDetector } = globalThis as { BarcodeDetector?: DetectorClass };
	if (!BarcodeDetector) return null;
	try {
		if (!(await BarcodeDetector.getSupportedFormats()).includes('qr_code')) return null;
		const detector = new BarcodeDetector({ formats: ['qr_code'] });
		return async (video) => {
			const { videoWidth: wide, videoHeight: high } = video;
			const found = await detector.detect(video);
			return found.map(({ rawValue, boundingBox: { x, y, width, height } }) => ({
				text: rawValue,
				x: (x + width / 2) / wide,
				y: (y + height / 2) / high
			}));
		};
	} catch {
		// It says it is there and is not: some systems ship it without its library.
		return null;
	}
}

/** Wide enough for a code that takes a sixth of the picture, and quick. */
const LONGEST = 960;

/** The reader that is shipped with the app, loaded only now. */
async function shippedReader(): Promise<Reader> {
	const [{ prepareZXingModule, readBarcodes }, { default: place }] = await Promise.all([
		import('zxing-wasm/reader'),
		import('zxing-wasm/reader/zxing_reader.wasm?url')
	]);
	prepareZXingModule({
		overrides: {
			locateFile: (path: string, prefix: string) => (path.endsWith('.wasm') ? place : prefix + path)
		},
		fireImmediately: true
	});
	const canvas = document.createElement('canvas');
	const pen = canvas.getContext('2d', { willReadFrequently: true })!;
	return async (video) => {
		const scale = Math.min(1, LONGEST / Math.max(video.videoWidth, video.videoHeight));
		canvas.width = Math.round(video.videoWidth * scale);
		canvas.height = Math.round(video.videoHeight * scale);
		pen.drawImage(video, 0, 0, canvas.width, canvas.height);
		const picture = pen.getImageData(0, 0, canvas.width, canvas.height);
		const found = await readBarcodes(picture, { formats: ['QRCode'], maxNumberOfSymbols: 8 });
		return found
			.filter((one) => one.isValid)
			.map(({ text, position: { topLeft, bottomRight } }) => ({
				text,
				x: (topLeft.x + bottomRight.x) / 2 / canvas.width,
				y: (topLeft.y + bottomRight.y) / 2 / canvas.height
			}));
	};
}

export const openReader = async (): Promise<Reader> =>
	(await platformReader()) ?? (await shippedReader());
