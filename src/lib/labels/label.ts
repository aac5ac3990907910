/** What stands on a label. It has no field for whose machine it was or who waits for a part. */
export type Label = { code: string; foot: string } & (
	| {
			what: 'part';
			name: string;
			engine: string;
			/** The first of its part numbers, or ''. */
			number: string;
			/** D12, or null for old stock. */
			donor: string | null;
			grade: string;
			bin: string | null;
			caution: string;
	  }
	| { what: 'box'; number: string; engine: string; cause: string; caution: string }
	| { what: 'bin'; address: string; purpose: string; place: string; caution: string }
	| { what: 'blank' }
);

export const LABEL_SAID: Record<Label['what'], [one: string, more: string]> = {
	part: ['part tag', 'part tags'],
	box: ['box label', 'box labels'],
	bin: ['bin sign', 'bin signs'],
	blank: ['blank tag', 'blank tags']
};
