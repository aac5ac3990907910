import { engineKey, numberKey } from '$lib/codes/number';
import { isKindId } from '$lib/trade';
import { z } from 'zod';
import { inCents, typedMoney } from '$lib/people/typed-money';

const words = (what: string, most: number) =>
	z
		.string({ error: `Enter ${what}` })
		.trim()
		.min(1, `Enter ${what}`)
		.max(most, `Keep ${what} under ${most} characters`);

const cents = (what: string) =>
	z
		.number({ error: `Enter ${what} in cents` })
		.int(`Enter ${what} in whole cents`)
		.min(1, `Enter ${what} above 0`)
		.max(100_000_000, `Enter ${what} up to 1,000,000`);

export const KindId = z
	.string({ error: 'Choose the kind of part' })
	.refine(isKindId, 'Choose the kind of part from the list');

const whatFor = {
	kind: KindId,
	engine: words('the engine', 120).optional(),
	number: words('the part number', 60).optional()
};

const whence = {
	source: words('the source: where you saw the price', 80),
	seenOn: z.iso.date({ error: 'Enter the date seen, like 2026-03-14' })
};

const version = z.coerce.number().int().min(1).optional();

const NEEDS_ONE = 'Enter the engine or the part number: a price belongs to one of them';
const hasOne = (input: { engine?: unknown; number?: unknown }) =>
	engineKey(String(input.engine ?? '')) !== '' || numberKey(String(input.number ?? '')) !== '';

/** Said together with what else is amiss, not after it. */
const needsOne = {
	error: NEEDS_ONE,
	path: ['engine'],
	when: ({ value }: { value: unknown }) => typeof value === 'object' && value !== null
};

/** A price as a script sends it: amounts in cents. */
export const PriceInput = z
	.object({
		...whatFor,
		newCents: cents('the price of a new one'),
		copyCents: cents('the price of a copy').nullish(),
		...whence,
		version
	})
	.refine(hasOne, needsOne);
export type PriceInput = z.infer<typeof PriceInput>;

/** A price as a form sends it: amounts as people type them. */
export const PriceForm = z
	.object({
		...whatFor,
		new: typedMoney('the price of a new one'),
		copy: typedMoney('the price of a copy').optional(),
		...whence,
		version,
		back: z.string().optional()
	})
	.refine(hasOne, needsOne);
export type PriceForm = z.infer<typeof PriceForm>;

/** A filled-in form as the list takes it. */
export const ofForm = (
	{ new: newAmount, copy, back: _, ...rest }: PriceForm,
	currency: string
): PriceInput => ({
	...rest,
	newCents: inCents(newAmount, currency),
	copyCents: copy === undefined ? null : inCents(copy, currency)
});

export const RemoveInput = z.object({ version: z.coerce.number().int().min(1) });
export const PutBackInput = z.object({ event: z.coerce.number().int().min(1) });
