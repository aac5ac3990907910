import { DONOR_SHOTS } from '$lib/donors/words';
import { z } from 'zod';
import { bin, grade, kindId, said } from '../typed';

const id = z.coerce.number().int().positive();
const ON_PHOTO = 'Tap the photo where it is';
const at = z.coerce.number({ error: ON_PHOTO }).min(0, ON_PHOTO).max(1, ON_PHOTO);
const tag = z.string().trim().min(1).max(40);
const SAY_WHAT = 'Choose a part, or a kind still to be pulled';

const oneOf = (input: { kind?: unknown; part?: unknown }) =>
	(input.kind === undefined) !== (input.part === undefined);

/** A pin at the outside edge: a kind still to be pulled, or a part by its tag. x and y run from 0 to 1. */
export const Pin = z
	.object({
		photo: id,
		x: at,
		y: at,
		kind: kindId.optional(),
		part: tag.optional()
	})
	.refine(oneOf, { error: SAY_WHAT, path: ['kind'] });
export type Pin = z.infer<typeof Pin>;

/** What a pin marks, as one button of a form says it: part:K7M3X or kind:coil. */
const what = z
	.string({ error: SAY_WHAT })
	.transform((typed): { kind?: string; part?: string } => {
		const [, which, name] = /^(part|kind):(.+)$/.exec(typed) ?? [];
		return which === 'part' ? { part: name } : { kind: name };
	})
	.pipe(z.object({ kind: kindId.optional(), part: tag.optional() }))
	.refine(oneOf, SAY_WHAT);

export const PinForm = z.object({ x: at, y: at, what }).transform(({ what, x, y }) => ({
	...{ x, y },
	...what
}));

/** What is left out stays as it is. */
export const PinChange = z.object({
	pin: id,
	x: at.optional(),
	y: at.optional(),
	what: what.optional()
});
export type PinChange = z.infer<typeof PinChange>;

export const PinRef = z.object({ pin: id });

const ends = { x1: at, y1: at, x2: at, y2: at };

export const RulerInput = z.object({
	...ends,
	length: said('Enter the length between the two points like 3/4", 2 7/16 or 25 mm', 40)
});
export type RulerInput = z.infer<typeof RulerInput>;

export const MeasureInput = z.object({
	...ends,
	part: said('Choose the part that was measured', 40),
	what: said('Say what was measured, like bolt to bolt', 60),
	/** The usual size that it is, in millimetres; without one it is noted as read. */
	as: z.coerce.number().positive().max(5000).optional()
});
export type MeasureInput = z.infer<typeof MeasureInput>;

export const ShotChange = z.object({
	shot: z.enum(DONOR_SHOTS, { error: 'Choose what the photo shows' })
});

const seenKind = z.object({ kind: kindId, grade });

/** Several kinds seen on one photo, each to become a part. */
export const Seen = z.object({
	kinds: z
		.array(seenKind)
		.min(1, 'Tick the kinds that you see')
		.max(60, 'Log at most 60 kinds at once'),
	bin: bin.optional()
});
export type Seen = z.infer<typeof Seen>;

const ownGrade = grade.optional().catch(undefined);

/** As the form sends it: ticks, one grade for all, and another for single ones as `grade-coil`. */
export const SeenForm = z
	.looseObject({
		kinds: z
			.array(kindId, { error: 'Tick the kinds that you see' })
			.min(1, 'Tick the kinds that you see'),
		grade,
		bin: bin.optional()
	})
	.transform(({ kinds, grade, bin, ...own }): z.input<typeof Seen> => ({
		kinds: kinds.map((kind) => ({ kind, grade: ownGrade.parse(own[`grade-${kind}`]) ?? grade })),
		bin
	}))
	.pipe(Seen);
