import type { SeenText, SeenWord } from '$lib/photos/seen';
import { cutOut, greyPicture, type Cut, type GreyPicture } from './text-picture';
import { withReader, type Layout, type ReadWord } from './text-reader';
import { legible, standOf, type Stand } from './text-stand';

const LARGEST = 2048;
const WIDEST = 2400;
/** Letters so many pixels high are read best. */
const LETTER = 34;

const LOOKS: [Layout, even: boolean][] = [
	['block', false],
	['scattered', true]
];

function middling(figures: number[]): number {
	const sorted = figures.toSorted((a, b) => a - b);
	return sorted[Math.floor(sorted.length / 2)] ?? 0;
}

/** The part of a picture in which something was read, with a margin; all of it where nothing was. */
function worthReading({ grey, words }: Stand, { width, height }: GreyPicture): Cut {
	const by = width / grey.width;
	const boxes = legible(words).map((word) => word.box);
	if (boxes.length === 0) return { left: 0, top: 0, width, height };
	const margin = 3 * middling(boxes.map((box) => box.y1 - box.y0));
	const at = (edge: number, most: number) => Math.round(Math.min(Math.max(edge * by, 0), most));
	const left = at(Math.min(...boxes.map((box) => box.x0)) - margin * 2, width - 1);
	const top = at(Math.min(...boxes.map((box) => box.y0)) - margin, height - 1);
	const right = at(Math.max(...boxes.map((box) => box.x1)) + margin * 2, width);
	const low = at(Math.max(...boxes.map((box) => box.y1)) + margin, height);
	return { left, top, width: Math.max(right - left, 1), height: Math.max(low - top, 1) };
}

/** Words with their places in shares of the whole picture. */
const placed = (words: ReadWord[], cut: Cut, scale: number, { width, height }: GreyPicture) =>
	words.map(({ text, sure, box }): SeenWord => ({
		text,
		sure,
		x: (cut.left + box.x0 / scale) / width,
		y: (cut.top + box.y0 / scale) / height,
		wide: (box.x1 - box.x0) / scale / width,
		high: (box.y1 - box.y0) / scale / height
	}));

/** How much larger the part is to be, so that its letters have the height that is read best. */
function scaleFor({ grey, words }: Stand, whole: GreyPicture, cut: Cut): number {
	const letter = middling(legible(words).map(({ box }) => box.y1 - box.y0));
	const high = letter * (whole.width / grey.width) || LETTER;
	return Math.min(3, Math.max(0.3, LETTER / high), WIDEST / cut.width);
}

/**
 * Reads the text off a photo: finds how it stands, then looks closer at the part where something stands, in
 * several ways. In: the bytes of a cleaned photo. Out: the words of each look. Throws when the reader breaks
 * or takes too long.
 */
export const readText = (bytes: Buffer): Promise<SeenText> =>
	withReader(async (read) => {
		const stand = await standOf(bytes, read);
		const whole = await greyPicture(bytes, stand.turn, LARGEST);
		const cut = worthReading(stand, whole);
		const scale = scaleFor(stand, whole, cut);
		const all = { left: 0, top: 0, width: stand.grey.width, height: stand.grey.height };
		const looks = [placed(stand.words, all, 1, stand.grey)];
		for (const [layout, even] of LOOKS) {
			const picture = await cutOut(whole, cut, scale, even);
			const words = await read(picture.bytes, layout);
			looks.push(placed(words, cut, picture.width / cut.width, whole));
		}
		return { turn: stand.turn, looks };
	});
