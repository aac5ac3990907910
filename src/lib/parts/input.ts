import { z } from 'zod';
import { BlankTag } from '../tags/input';
import { bin, grade, grams, kindId, numbers, said, ticks, version, words, yesNo } from './typed';
import { PROOFS } from './words';

export const Proof = z.object({
	how: z.enum(PROOFS, { error: 'Choose how it was checked' }),
	figure: z.coerce.number({ error: 'Enter the figure as a number' }).finite().optional(),
	unit: words(20).optional(),
	/** What its test read, by field. */
	figures: z
		.record(
			z.string().max(30),
			z.coerce.number({ error: 'Enter each figure as a number, like 18 or 18.5' }).finite()
		)
		.optional(),
	passed: yesNo,
	note: words(500).optional()
});
export type Proof = z.infer<typeof Proof>;

export const Scrap = z.object({
	reason: said('Say why it goes to scrap'),
	destroyed: yesNo.optional()
});
export type Scrap = z.infer<typeof Scrap>;

export const logged = {
	kind: kindId,
	grade: grade.optional(),
	label: words(120).optional(),
	numbers: numbers.optional(),
	proof: Proof.optional(),
	massGrams: grams.optional(),
	bin: bin.optional(),
	note: words(1000).optional(),
	checklist: ticks.optional(),
	set: words(200).optional(),
	setMissing: words(200).optional(),
	tag: BlankTag,
	/** Straight to scrap, with the reason; what can never be stock is logged so. */
	scrapped: Scrap.optional()
};

export const gradeOrScrap = (input: { grade?: unknown; scrapped?: unknown }) =>
	input.grade !== undefined || input.scrapped !== undefined;
export const ASK_GRADE = { error: 'Choose a grade', path: ['grade'] };

export const Pull = z.object(logged).refine(gradeOrScrap, ASK_GRADE);
export type Pull = z.infer<typeof Pull>;

export const OldStock = z
	.object({ ...logged, engine: words(120).optional() })
	.refine(gradeOrScrap, ASK_GRADE);
export type OldStock = z.infer<typeof OldStock>;

export const Move = z.object({ bin });
export type Move = z.infer<typeof Move>;

/** Parts in hand and the place they go to. */
export const PutAway = z.object({
	parts: z
		.array(said('Scan the parts first', 20))
		.min(1, 'Scan the parts first')
		.max(200, 'Put 200 parts away at most at once'),
	bin
});
export type PutAway = z.infer<typeof PutAway>;

/** The events of moves made together, with commas between as a form sends them. */
export const UndoParts = z.object({
	events: z
		.union([z.string().transform((typed) => typed.split(',').map(Number)), z.array(z.number())])
		.pipe(z.array(z.number().int().positive()).min(1).max(200))
});
export type UndoParts = z.infer<typeof UndoParts>;

export const GradeInput = z.object({ grade, version });
export type GradeInput = z.infer<typeof GradeInput>;

/** What is left out stays as it is. */
export const Edit = z.object({
	version,
	grade: grade.optional(),
	label: words(120).optional(),
	numbers: numbers.optional(),
	massGrams: grams.nullish(),
	note: words(1000).optional(),
	set: words(200).optional(),
	setMissing: words(200).optional(),
	engine: words(120).optional()
});
export type Edit = z.infer<typeof Edit>;

export const Hold = z.object({
	for: said('Say who or which job it is held for', 80),
	/** Day or moment; without one it is a week. */
	until: z
		.union([z.iso.date(), z.iso.datetime({ offset: true })], {
			error: 'Enter the date it is held until'
		})
		.optional()
});
export type Hold = z.infer<typeof Hold>;

/** A kind that is left on its donor, or taken up again. */
export const Leave = z.object({ kind: kindId });

/** Which of a part's events is undone. */
export const UndoPart = z.object({ event: z.int('Name the event that is undone') });

export const Nothing = z.object({});

export const Fit = z.object({ job: said('Say which job it was fitted on', 80) });
export type Fit = z.infer<typeof Fit>;

export const Sell = z.object({
	cents: z
		.int({ error: 'Enter the price in whole cents' })
		.min(0, 'Enter a price of nothing or more')
		.max(100_000_000, 'Enter a smaller price'),
	to: words(80).optional()
});
export type Sell = z.infer<typeof Sell>;

export const Clean = z.object({
	/** It works after this attempt. */
	cameRight: yesNo,
	minutes: z.coerce
		.number({ error: 'Enter the minutes as a number' })
		.min(0, 'Enter the minutes as a number')
		.max(1000, 'Enter the minutes as a number under 1000')
		.optional()
});
export type Clean = z.infer<typeof Clean>;

export const TakeBack = z.object({ reason: said('Say why it came back') });
export type TakeBack = z.infer<typeof TakeBack>;
