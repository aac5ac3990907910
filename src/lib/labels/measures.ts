import { z } from 'zod';
import type { Measures } from './stocks';

/** How far a printer may be off before labels run over the edge of the page. */
const SLACK = 0.1;

const mm = (what: string, least: number, most: number) => {
	const say = `Enter ${what} in mm, from ${least} to ${most}`;
	return z
		.union(
			[
				z.number(),
				z
					.string()
					.trim()
					.regex(/^\d{1,3}([.,]\d{1,3})?$/, say)
			],
			{ error: say }
		)
		.transform((typed) => (typeof typed === 'number' ? typed : Number(typed.replace(',', '.'))))
		.refine((value) => value >= least && value <= most, say);
};

const count = (what: string, most: number) => {
	const say = `Enter ${what} as a whole number from 1 to ${most}`;
	return z.coerce.number({ error: say }).int(say).min(1, say).max(most, say);
};

const rooms: [keyof Measures, string, (m: Measures) => boolean][] = [
	[
		'across',
		'So many labels across do not go on the page: look at their width, the margin and the pitch',
		(m) => m.left + (m.across - 1) * m.pitchX + m.width <= m.pageWidth + SLACK
	],
	[
		'down',
		'So many labels down do not go on the page: look at their height, the margin and the pitch',
		(m) => m.top + (m.down - 1) * m.pitchY + m.height <= m.pageHeight + SLACK
	],
	[
		'pitchX',
		'Labels lie over each other: enter a pitch across of at least their width',
		(m) => m.across === 1 || m.pitchX >= m.width - SLACK
	],
	[
		'pitchY',
		'Labels lie over each other: enter a pitch down of at least their height',
		(m) => m.down === 1 || m.pitchY >= m.height - SLACK
	]
];

/** What a shop says of its own sheets: lengths in mm. The label must hold a code that is read. */
export const MeasuresInput = z
	.object({
		width: mm('the width of a label', 38, 300),
		height: mm('the height of a label', 19, 300),
		across: count('how many labels lie across', 12),
		down: count('how many labels lie down', 40),
		left: mm('the left margin', 0, 150),
		top: mm('the top margin', 0, 150),
		pitchX: mm('the pitch across', 1, 300),
		pitchY: mm('the pitch down', 1, 300),
		pageWidth: mm('the width of the page', 38, 330),
		pageHeight: mm('the height of the page', 19, 500)
	})
	.superRefine((measures, issues) => {
		for (const [field, message, holds] of rooms)
			if (!holds(measures)) issues.addIssue({ code: 'custom', path: [field], message });
	});
