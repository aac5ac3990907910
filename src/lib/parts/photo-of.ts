import { z } from 'zod';
import { readTag } from '../codes';
import { ShotInput } from '../donors/input';
import { donorNumber, sayNumber } from '../donors/reference';

const WANTED = 'Enter the tag on it, five characters like K7M3X, or the donor, like D12';

/** The tag of a part or box, or the number of a donor, as it is written; null when it is neither. */
export function readOf(typed: string): string | null {
	const number = donorNumber(typed);
	if (number !== null) return sayNumber(number);
	const reading = readTag(typed);
	return 'tag' in reading ? reading.tag : null;
}

/** A photo of anything that carries a tag or a number. */
export const PhotoOf = ShotInput.extend({
	of: z
		.string({ error: WANTED })
		.max(40, WANTED)
		.transform((typed, check) => {
			const of = readOf(typed);
			if (of === null) check.addIssue({ code: 'custom', message: WANTED });
			return of ?? '';
		})
});
export type PhotoOf = z.output<typeof PhotoOf>;
