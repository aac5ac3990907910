import { readTag } from '../codes';

export type Scan =
	| { tag: string }
	/** A tag, but of another shop. */
	| { elsewhere: true }
	/** No tag; `suggestion` where two neighbours were swapped. */
	| { unread: string; suggestion?: string };

const ADDRESS = /^https?:\/\/[^/]+\/t\/([^/]+)\/([^/?#]+)\/?$/i;

/** What a camera saw or somebody typed: the address on a label, on whatever host it was printed, or the code alone. */
export function readScan(text: string, slug: string): Scan {
	const address = ADDRESS.exec(text.trim());
	if (address && address[1]!.toLowerCase() !== slug.toLowerCase()) return { elsewhere: true };
	const typed = address ? address[2]! : text;
	const reading = readTag(typed);
	if ('tag' in reading) return reading;
	const { suggestion } = reading;
	return { unread: typed.trim().slice(0, 40), ...(suggestion ? { suggestion } : {}) };
}

/** Why a scan leads nowhere, in words; null when it is a tag. */
export function sayScan(scan: Scan): string | null {
	if ('tag' in scan) return null;
	if ('elsewhere' in scan) return 'This is the tag of another shop.';
	if (scan.suggestion) return `${scan.unread} has a slip in it. Is it ${scan.suggestion}?`;
	return scan.unread === ''
		? 'Type the five characters of the tag.'
		: `“${scan.unread}” is no tag. Tags have five characters, like K7M3X.`;
}
