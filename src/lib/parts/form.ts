import { z } from 'zod';
import { setOf } from '../trade';
import { ownPath } from '../people/own-path';
import { typedAmount } from '../people/typed-money';
import { DESTROYED, NOT_KEPT, readIn } from './bench/answer';
import { ASK_GRADE, Edit, gradeOrScrap, logged, Proof } from './input';
import { ticks, words, yesNo } from './typed';

/** Figures come in fields named after what the test reads, `read-coil`. */
const withFigures = (fields: unknown) => {
	const figures = readIn(fields as Record<string, unknown>);
	return figures ? { ...(fields as object), figures } : fields;
};

/** A proof as its form sends it. */
export const ProofForm = z.preprocess(withFigures, Proof);

interface TypedSet {
	kind: string;
	set?: string | undefined;
	setMissing?: string | undefined;
}

/** What was ticked as missing, beside what was typed. */
function setWithout(typed: TypedSet, missing: readonly string[]) {
	const there = setOf(typed.kind).filter((piece) => !missing.includes(piece));
	return {
		set: typed.set || there.join(', '),
		setMissing: [...missing, typed.setMissing].filter(Boolean).join(', ')
	};
}

const FlatLog = z.object({
	...logged,
	proof: z.undefined().optional(),
	scrapped: z.undefined().optional(),
	engine: words(120).optional(),
	/** The button of a bin that was suggested. */
	put: words(40).optional(),
	how: Proof.shape.how.optional(),
	figure: Proof.shape.figure,
	figures: Proof.shape.figures,
	unit: Proof.shape.unit,
	passed: yesNo.optional(),
	scrap: z.enum(['scrap', 'destroy']).optional(),
	reason: words(120).optional(),
	/** Ticked as missing from the set that belongs to the kind. */
	missing: ticks.optional()
});

/** Logging as a flat form sends it: the proof's fields beside the others, `scrap` a button. */
export const LogForm = z
	.preprocess(withFigures, FlatLog)
	.transform(({ how, figure, figures, unit, passed, scrap, reason, put, missing, ...rest }) => ({
		...rest,
		...(missing ? setWithout(rest, missing) : {}),
		bin: put ?? rest.bin,
		proof: how ? { how, figure, figures, unit, passed: passed ?? true } : undefined,
		scrapped: scrap
			? {
					reason: reason ?? (scrap === 'destroy' ? DESTROYED : NOT_KEPT),
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

/** What is taken back: one event, or several done in one go, with commas between. */
export const Undo = z.object({
	event: z
		.string()
		.transform((typed) => typed.split(','))
		.pipe(z.array(z.coerce.number<string>().int().positive()).max(60)),
	back: z.string().default('/').transform(ownPath)
});
export type Undo = z.infer<typeof Undo>;
