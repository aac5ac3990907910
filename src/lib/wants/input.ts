import { z } from 'zod';
import { CustomerInput, reach } from '../customers/input';
import { numberKey } from '../codes/number';
import { kindId, numbers, words } from '../parts/typed';
import { inCents, typedMoney } from '../people/typed-money';
import { TELL_BY } from './words';

const id = z.coerce.number({ error: 'Choose who waits from the list' }).int().positive();

const what = {
	kind: kindId.optional(),
	engine: words(120).optional(),
	measures: words(120).optional(),
	numbers: numbers.optional(),
	note: words(500).optional(),
	tellBy: z.enum(TELL_BY, { error: 'Choose how to tell them' }).optional()
};

const MOST = 100_000_000;
const mostCents = z
	.int({ error: 'Enter the most they pay in whole cents' })
	.min(1, 'Enter the most they pay above 0')
	.max(MOST, 'Enter the most they pay up to 1,000,000');

/** Said together with what else is amiss, not after it. */
const whole = ({ value }: { value: unknown }) => typeof value === 'object' && value !== null;

const namesPart = (typed: { kind?: unknown; numbers?: readonly string[] }) =>
	typed.kind !== undefined || (typed.numbers ?? []).some((one) => numberKey(one) !== '');
const ASK_PART = {
	error: 'Choose the kind of part, or enter its number',
	path: ['kind'],
	when: whole
};

/** A want as a script sends it: who waits is a customer by id or by name, or a job of the shop's own. */
export const WantInput = z
	.object({
		customer: z.union([id, CustomerInput]).optional(),
		job: words(80).optional(),
		...what,
		mostCents: mostCents.optional()
	})
	.refine(({ customer, job }) => (customer === undefined) !== !job, {
		error: 'Say who waits: a customer, or a job of your own',
		path: ['customer'],
		when: whole
	})
	.refine(namesPart, ASK_PART);
export type WantInput = z.infer<typeof WantInput>;

/** What is left out stays as it is. */
export const WantEdit = z.object({
	...what,
	kind: z.union([z.literal(''), kindId]).optional(),
	mostCents: mostCents.nullish(),
	version: z.coerce.number({ error: 'Reload the page and save again' }).int()
});
export type WantEdit = z.infer<typeof WantEdit>;

const amount = typedMoney('the most they pay').optional();

const PERSON = ['name', 'customerKind', 'phone', 'email'];
const ASKED: Record<string, readonly string[]> = { known: ['customer'], new: PERSON, job: ['job'] };

/** Only the fields of who waits count: what was typed into the others is not seen any more. */
function onlyAsked(typed: unknown): unknown {
	if (typeof typed !== 'object' || typed === null || !('who' in typed)) return typed;
	const theirs = ASKED[String(typed.who)] ?? [];
	const others = Object.values(ASKED)
		.flat()
		.filter((field) => !theirs.includes(field));
	return Object.fromEntries(Object.entries(typed).filter(([field]) => !others.includes(field)));
}

/** A want as its form sends it: who waits as one of three, with the fields of each beside. */
export const WantForm = z.preprocess(
	onlyAsked,
	z
		.object({
			who: z.enum(['known', 'new', 'job'], { error: 'Choose who waits' }),
			customer: id.optional(),
			name: words(80).optional(),
			customerKind: reach.kind,
			phone: reach.phone,
			email: reach.email,
			job: words(80).optional(),
			...what,
			most: amount
		})
		.superRefine(({ who, customer, name, job }, issues) => {
			const ask = (path: string, message: string) =>
				issues.addIssue({ code: 'custom', path: [path], message });
			if (who === 'known' && !customer) ask('customer', 'Choose who waits from the list');
			if (who === 'new' && !name) ask('name', 'Enter the name of who waits');
			if (who === 'job' && !job) ask('job', 'Say which job it is for');
		})
		.refine(namesPart, ASK_PART)
);
export type WantForm = z.infer<typeof WantForm>;

/** A filled-in form as the verb takes it. */
export function ofForm(typed: WantForm, currency: string): WantInput {
	const { who, customer, name, customerKind, phone, email, job, most, ...rest } = typed;
	const person = { name: name ?? '', kind: customerKind, phone, email, note: '' };
	return {
		...rest,
		...(who === 'known' ? { customer } : who === 'new' ? { customer: person } : { job }),
		...(most === undefined ? {} : { mostCents: inCents(most, currency) })
	};
}

/** The form that changes a want: an emptied field is empty. */
export const WantEditForm = z
	.object({ ...what, most: amount, version: WantEdit.shape.version })
	.refine(namesPart, ASK_PART);
export type WantEditForm = z.infer<typeof WantEditForm>;

export const ofEditForm = ({ most, ...typed }: WantEditForm, currency: string): WantEdit => ({
	...{ kind: '', engine: '', measures: '', numbers: [], note: '' },
	...typed,
	mostCents: most === undefined ? null : inCents(most, currency)
});

export const TellInput = z.object({
	by: z.enum(TELL_BY, { error: 'Choose how they were told' }),
	/** Of what they are told; without it the best that is here. */
	match: z.coerce.number().int().positive().optional()
});
export type TellInput = z.infer<typeof TellInput>;

export const YesInput = z.object({
	/** The tag of the part that is kept for them; without one nothing is held yet. */
	part: words(20).optional()
});
export type YesInput = z.infer<typeof YesInput>;

export const Nothing = z.object({});
export const MatchRef = z.object({ match: z.coerce.number().int().positive() });
export const EventRef = z.object({ event: z.coerce.number().int().positive() });
export const LetterRef = z.object({ letter: z.coerce.number().int().positive() });
