/** A part that was scanned and waits for its bin. */
export interface InHand {
	tag: string;
	name: string;
	/** Where it lay when it was scanned. */
	bin: string | null;
	grade: string;
	state: string;
	gone: string | null;
}

/** A bin or a box that was scanned with nothing in hand. */
export interface Seen {
	name: string;
	said: string;
	href: string;
}

interface Part {
	tag: string;
	label: string;
	kindName: string;
	bin: string | null;
	grade: string;
	state: string;
	taken: string | null;
}

export const inHand = ({ tag, label, kindName, bin, grade, state, taken }: Part): InHand => ({
	...{ tag, name: label || kindName, bin, grade, state, gone: taken }
});

/** What the shop says a tag is. */
export type Tagged = { code: string } & (
	| { what: 'part'; part: Part }
	| { what: 'bin'; bin: { address: string; purpose: string; parts: number } }
	| { what: 'box'; donor: { number: string; engine: string; state: string } }
	| { what: 'blank' }
);

export function seenPlace(home: string, found: Tagged): Seen | null {
	if (found.what === 'bin') {
		const { address, purpose, parts } = found.bin;
		const said = [purpose, `${parts} in it`].filter(Boolean).join(', ');
		return { name: address, said, href: `${home}/bins/${found.code}` };
	}
	if (found.what !== 'box') return null;
	const { number, engine, state } = found.donor;
	return { name: number, said: `${engine}, ${state}`, href: `${home}/donors/${number}` };
}
