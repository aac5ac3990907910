import { z } from 'zod';
import { ownPath } from '../people/own-path';
import { typedAmount } from '../people/typed-money';
import { ASK_GRADE, Edit, gradeOrScrap, logged, Proof } from './input';
import { words, yesNo } from './typed';

/** Logging as a flat form sends it: the proof's fields beside the others, `scrap` a button. */
export const LogForm = z
	.object({
		...logged,
		proof: z.undefined().optional(),
		scrapped: z.undefined().optional(),
		engine: words(120).optional(),
		how: Proof.shape.how.optional(),
		figure: Proof.shape.figure,
		unit: Proof.shape.unit,
		passed: yesNo.optional(),
		scrap: z.enum(['scrap', 'destroy']).optional(),
		reason: words(120).optional()
	})
	.transform(({ how, figure, unit, passed, scrap, reason, ...rest }) => ({
		...rest,
		proof: how ? { how, figure, unit, passed: passed ?? true } : undefined,
		scrapped: scrap
			? {
					reason: reason ?? (scrap === 'destroy' ? 'destroyed, not safe' : 'not worth keeping'),
					destroyed: scrap === 'destroy'
				}
			: undefined
	}))
	.refine(gradeOrScrap, ASK_GRADE);
export type LogForm = z.infer<typeof LogForm>;

/** A form leaves out what was emptied, so there everything absent is empty. */
export const EditForm = Edit.transform((typed) => ({
	label: '',
	numbers: [],
	massGrams: null,
	note: '',
	set: '',
	setMissing: '',
	engine: '',
	...typed
}));

/** The price as people type it: 46, 46.50 or 46,50. */
export const SellForm = z.object({
	price: z.string({ error: 'Enter what it was sold for' }).transform((typed, issues) => {
		const amount = typedAmount(typed);
		if (amount !== null && amount <= 1_000_000) return amount;
		issues.addIssue('Enter the price like 46 or 46.50');
		return z.NEVER;
	}),
	to: words(80).optional()
});
export type SellForm = z.infer<typeof SellForm>;

export const Undo = z.object({
	event: z.coerce.number().int().positive(),
	back: z.string().default('/').transform(ownPath)
});
export type Undo = z.infer<typeof Undo>;
