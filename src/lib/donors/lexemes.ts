import { numberKey } from '../codes/number';
import { cubicInchToCc, inchToMm } from '../units';

/** One thing that somebody wrote or typed, in the spelling in which such things are compared. */
export interface Token {
	said: string;
	is: 'word' | 'code' | 'size' | 'amount';
	/** Lower case for words, as a part number for codes, 19.1mm for sizes, 210cc for amounts. */
	lexeme: string;
	/** What a code is made of: HX-270V is also hx and 270V. */
	pieces: string[];
}

const COUNTED = ['two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];
const GLYPHS: Record<string, string> = {
	...{ '½': ' 1/2', '¼': ' 1/4', '¾': ' 3/4', '⅛': ' 1/8', '⅜': ' 3/8', '⅝': ' 5/8', '⅞': ' 7/8' }
};
const INCH = String.raw`(?:in(?:ch(?:es)?)?(?![a-z])|["″”])`;
const FRACTION = String.raw`(?<![\w./-])(?:(?<whole>\d{1,2})[ -])?(?<top>\d{1,2})/(?<bottom>2|4|8|16|32|64)(?![\w/])(?:[ -]?${INCH})?`;
const LENGTH = String.raw`(?<![\w./-])(?<length>\d{0,4}[.,]?\d{1,3})[ -]?(?:(?<metric>mm|cm)(?![a-z0-9])|${INCH})`;
const AMOUNT = String.raw`(?<![\w./-])(?<amount>\d{0,5}[.,]?\d{1,3})[ -]?(?<unit>cc|ccm|cm3|cu\.? ?in|ci|cid|hp|kw|kv|v|volts?|a|amps?|tooth|teeth)(?![a-z0-9])`;
const CODE = String.raw`(?<code>[\p{L}\p{N}]+(?:[-–—./_][\p{L}\p{N}]+)*)`;
const ANY = new RegExp(`${FRACTION}|${LENGTH}|${AMOUNT}|${CODE}`, 'giu');

// what a calliper tells apart: 22.2 is 7/8 in, 25 and 1 in stay two sizes
const size = (mm: number) => `${Math.round(mm * 10 + 1e-6) / 10}mm`;
const figure = (text: string) => Number(text.replace(',', '.'));

function amount(count: number, unit: string): string {
	const plain = unit.replace(/[. ]/g, '');
	if (/^(cc|ccm|cm3)$/.test(plain)) return `${Math.round(count)}cc`;
	if (/^(cuin|ci|cid)$/.test(plain)) return `${Math.round(cubicInchToCc(count))}cc`;
	if (/^(tooth|teeth)$/.test(plain)) return `${count}tooth`;
	return `${count}${plain.startsWith('v') ? 'v' : plain.startsWith('a') ? 'amp' : plain}`;
}

/** A word without its plural s, accents and capitals. */
function plain(word: string): string {
	const bare = word.normalize('NFKD').replace(/\p{M}/gu, '');
	const counted = COUNTED.indexOf(bare);
	if (counted >= 0) return `${counted + 2}`;
	return /[^s]s$/.test(bare) && bare.length > 3 ? bare.slice(0, -1) : bare;
}

const piece = (text: string) => (/\d/.test(text) ? numberKey(text) : plain(text));

function tokenOf(said: string, found: Record<string, string | undefined>): Token[] {
	const { whole, top, bottom, length, metric, amount: count, unit, code } = found;
	if (top && bottom) {
		const inches = Number(whole ?? 0) + Number(top) / Number(bottom);
		return [{ said, is: 'size', lexeme: size(inchToMm(inches)), pieces: [] }];
	}
	if (length) {
		const mm = metric ? figure(length) * (metric === 'cm' ? 10 : 1) : inchToMm(figure(length));
		return [{ said, is: 'size', lexeme: size(mm), pieces: [] }];
	}
	if (count && unit) {
		// 270V may be a model too
		return [{ said, is: 'amount', lexeme: amount(figure(count), unit), pieces: [numberKey(said)] }];
	}
	const parts = (code ?? '').split(/[-–—./_]/).filter(Boolean);
	if (!/\d/.test(code ?? ''))
		return parts.map((part) => ({ said: part, is: 'word', lexeme: plain(part), pieces: [] }));
	const pieces = parts.length > 1 ? parts.map(piece).filter(Boolean) : [];
	return [{ said, is: 'code', lexeme: numberKey(code ?? ''), pieces }];
}

/** Fractions in one character as they are typed with a stroke. */
export const plainFractions = (text: string): string =>
	text.replace(/[½¼¾⅛⅜⅝⅞]/g, (glyph) => GLYPHS[glyph] ?? '').replaceAll('⁄', '/');

/**
 * What a text is made of: words, codes, sizes in whatever unit, amounts such as 210cc or 6.5hp.
 * In: anything. Out: its tokens in their order, none of them empty. Never throws.
 */
export function tokensOf(text: string): Token[] {
	const readable = plainFractions(text.toLowerCase())
		.normalize('NFKC')
		.replace(/\b(?:one|an) inch\b/g, '1 inch')
		.replace(/\bhalf inch\b/g, '1/2 inch');
	return [...readable.matchAll(ANY)]
		.flatMap((found) => tokenOf(found[0].trim(), found.groups ?? {}))
		.filter((token) => token.lexeme !== '');
}

/** Everything that a text can be found by, apart by spaces. */
export function lexemesOf(...texts: readonly string[]): string {
	const all = tokensOf(texts.join(' ; ')).flatMap(({ lexeme, pieces }) => [lexeme, ...pieces]);
	return [...new Set(all)].join(' ');
}

export interface EnginePlate {
	maker: string;
	model: string;
	typeCode: string;
	dateCode: string;
	serial: string;
	emissionFamily?: string;
	displacementCc: number | null;
	offMachine: string;
	shaft: string | null;
}

/** What a donor lends its parts to be found by. */
export function engineLexemes(plate: EnginePlate): string {
	const { maker, model, typeCode, dateCode, serial, displacementCc, offMachine, shaft } = plate;
	const family = plate.emissionFamily ?? '';
	const whole = [model, typeCode, dateCode, serial, family]
		.map(numberKey)
		.filter((key) => /\d/.test(key));
	const cc = displacementCc ? [`${Math.round(displacementCc)}cc`] : [];
	const rest = lexemesOf(maker, model, typeCode, dateCode, serial, offMachine, shaft ?? '');
	return [...new Set([...whole, ...cc, ...rest.split(' ')])].filter(Boolean).join(' ');
}
