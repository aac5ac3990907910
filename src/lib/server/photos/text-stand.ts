import { greyPicture, type GreyPicture } from './text-picture';
import type { Reader, ReadWord } from './text-reader';

/** How a label stands on its photo: turned clockwise by so many degrees its lines run level. */
export interface Stand {
	turn: number;
	grey: GreyPicture;
	words: ReadWord[];
}

const LARGEST = 1400;
/** So many characters are text; fewer may be marks that look like some. */
const ENOUGH = 16;
/** Text that stands upside down is read as other characters, none of them quite sure. */
const FIRM = 0.93;
const LEAN = 0.7;
const MOST_LEAN = 14;

const mean = (figures: number[]) =>
	figures.reduce((sum, one) => sum + one, 0) / Math.max(figures.length, 1);

/** The words that are text rather than scratches. */
export const legible = (words: ReadWord[]): ReadWord[] =>
	words.filter(({ text, sure }) => mean(sure) > 0.6 && /[\p{L}\p{N}]{2}/u.test(text));

const count = (words: ReadWord[]) => legible(words).reduce((sum, { text }) => sum + text.length, 0);

function firmness(words: ReadWord[]): number {
	const weighed = legible(words).map(({ text, sure }) => text.length * Math.min(...sure));
	return weighed.reduce((sum, one) => sum + one, 0) / Math.max(count(words), 1);
}

async function turnedBy(bytes: Buffer, turn: number, read: Reader): Promise<Stand> {
	const grey = await greyPicture(bytes, turn, LARGEST);
	return { turn, grey, words: await read(grey.bytes, 'scattered') };
}

const settled = ({ words }: Stand) => count(words) >= ENOUGH && firmness(words) >= FIRM;

/** As it is, when that can be read; else each way round, of those that show most the firmest. */
async function wayUp(bytes: Buffer, read: Reader): Promise<Stand> {
	const stands: Stand[] = [];
	for (const turn of [0, 90, 270, 180]) {
		const stand = await turnedBy(bytes, turn, read);
		if (settled(stand)) return stand;
		stands.push(stand);
	}
	const most = Math.max(...stands.map(({ words }) => count(words)));
	const full = stands.filter(({ words }) => count(words) * 2 >= most);
	return full.sort((a, b) => firmness(b.words) - firmness(a.words))[0]!;
}

const centre = ({ box }: ReadWord) => ({ x: (box.x0 + box.x1) / 2, y: (box.y0 + box.y1) / 2 });
const high = ({ box }: ReadWord) => box.y1 - box.y0;

/** How the words stand to their neighbours on the right, and how each runs: angles in degrees. */
function angles(words: ReadWord[]): number[] {
	const pairs = words.flatMap((one) =>
		words.flatMap((other) => {
			const [from, to] = [centre(one), centre(other)];
			const far = to.x - from.x;
			const alike = Math.max(high(one), high(other)) < 2.2 * Math.min(high(one), high(other));
			if (!alike || far < high(one) || far > 16 * high(one)) return [];
			return [(Math.atan2(to.y - from.y, far) * 180) / Math.PI];
		})
	);
	const own = words.filter(({ text }) => text.length > 5).map(({ slope }) => slope);
	return [...pairs, ...own].filter((angle) => Math.abs(angle) < MOST_LEAN);
}

/** The angle about which most of them lie: lines that run level agree, rows apart do not. */
export function leanOf(words: ReadWord[]): number {
	const all = angles(legible(words));
	const about = (angle: number) => all.filter((other) => Math.abs(other - angle) < 1);
	const [best] = all.map(about).sort((a, b) => b.length - a.length);
	return best && best.length > 2 ? mean(best) : 0;
}

/** How the text on a photo stands; straightened where its lines lean, and once more where that was too little. */
export async function standOf(bytes: Buffer, read: Reader): Promise<Stand> {
	let stand = await wayUp(bytes, read);
	for (let round = 0; round < 2; round += 1) {
		const lean = leanOf(stand.words);
		if (Math.abs(lean) < LEAN) break;
		stand = await turnedBy(bytes, stand.turn - lean, read);
	}
	return stand;
}
