import type { CauseId } from '../trade';

const CALLED: [RegExp, CauseId[]][] = [
	[
		/\b(?:blown|blew)(?: up)?(?: (?:engine|motor|block))?\b/,
		['thrown-rod', 'no-oil', 'broken-block', 'lean']
	],
	[/\b(?:threw|thrown|throwed)(?: a)? rod\b|\bhole in (?:the )?block\b/, ['thrown-rod']],
	[/\bseized?(?: up)?\b|\bsiezed\b|\blocked up\b/, ['no-oil', 'lean', 'water']],
	[/\b(?:ran|run) (?:without|out of|low on) oil\b|\bno oil\b/, ['no-oil']],
	[/\bflood(?:ed)?\b|\bsubmerged\b|\bdrowned\b/, ['flood', 'water']],
	[/\brust(?:ed)? stuck\b|\bwater in (?:the )?crankcase\b/, ['water']],
	[/\bburn(?:t|ed) (?:out|down|up)\b|\b(?:caught|engine) fire\b/, ['fire']],
	[/\bblade strike\b|\bhit (?:a )?(?:stump|curb|rock|root)\b|\bsheared key\b/, ['strike']],
	[/\b(?:stale|bad|old) (?:fuel|gas|petrol)\b|\bgummed(?: up)?\b/, ['stale-fuel']],
	[/\boverheated\b|\bcooked\b|\bblown head gasket\b/, ['overheated']],
	[/\bover ?speed(?:ed)?\b|\bran away\b/, ['overspeed']],
	[/\bworn out\b|\bsmok(?:es|ed|ing)\b|\blow compression\b/, ['worn']],
	[/\b(?:dropped|burnt|burned|stuck) valve\b/, ['valve']],
	[/\bdusted\b|\bdirt eaten\b|\bscored bore\b/, ['dirt']],
	[/\b(?:broken|cracked) block\b/, ['broken-block']],
	[/\bretired running\b|\bran (?:fine|well|good)\b/, ['retired']],
	[/\belectrical only\b/, ['electrical']]
];

/** How its donor died, read off the words; and the words without it. */
export function readCause(text: string): { causes: CauseId[]; said: string; rest: string } {
	for (const [called, causes] of CALLED) {
		const found = called.exec(text)?.[0];
		if (found) return { causes, said: found, rest: text.replace(found, ' ') };
	}
	return { causes: [], said: '', rest: text };
}

const MONTH = 'jan feb mar apr may jun jul aug sep oct nov dec'.split(' ');
const DATED =
	/\b(jan|feb|mar|apr|may|jun|jul|aug|sept?|oct|nov|dec)(?:uary|ruary|ch|il|e|y|ust|tember|ober|ember)?\.?[ -]?'?((?:19|20)?\d\d)\b/;
const YEAR = /\b(?:in|from|of|since) ((?:19|20)\d\d)\b/;

/** When it came in, as 2024-10 or 2024; and the words without it. */
export function readMonth(text: string): { month: string | null; rest: string } {
	const [whole, month, year] = DATED.exec(text) ?? [];
	if (whole && month && year) {
		const full = year.length === 2 ? `20${year}` : year;
		const at = `${MONTH.indexOf(month.slice(0, 3)) + 1}`.padStart(2, '0');
		return { month: `${full}-${at}`, rest: text.replace(whole, ' ') };
	}
	const [said, alone] = YEAR.exec(text) ?? [];
	return said && alone
		? { month: alone, rest: text.replace(said, ' ') }
		: { month: null, rest: text };
}
