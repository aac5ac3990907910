import { z } from 'zod';
import { BlankTag } from '../tags/input';
import { isKindId, matchKinds } from '../trade';
import { BIN_SIZES } from './size';
import { BIN_USES } from './use';

const words = (what: string, most: number) =>
	z.string().trim().max(most, `Keep ${what} under ${most} characters`);

const address = z
	.string({ error: 'Enter the address, like K3-1' })
	.trim()
	.min(1, 'Enter the address, like K3-1')
	.max(40, 'Keep the address under 40 characters');

const uses = z.array(z.enum(BIN_USES)).max(BIN_USES.length);
const loadKg = z.number().positive('Enter the kilograms as a number above 0').max(10_000);
const litres = z.number().positive('Enter the litres as a number above 0').max(100_000);
const size = z.enum(BIN_SIZES, { error: 'Choose the size' });
const cents = z.number().int().min(0).max(100_000_000);

export const BinInput = z.object({
	address,
	size,
	litres: litres.nullish(),
	loadKg: loadKg.nullish(),
	yearlyCostCents: cents.nullish(),
	uses: uses.optional(),
	kinds: z.array(z.string().refine(isKindId, 'Choose kinds from the list')).max(40).optional(),
	purpose: words('what it is for', 200).default(''),
	place: words('where it stands', 120).default(''),
	red: z.boolean().default(false),
	tag: BlankTag
});
export type BinInput = z.infer<typeof BinInput>;

export const BinEdit = BinInput.omit({ tag: true }).extend({ version: z.number().int() });
export type BinEdit = z.infer<typeof BinEdit>;

const figure = (what: string) =>
	z
		.string()
		.trim()
		.regex(/^\d{1,7}([.,]\d{1,2})?$/, `Enter ${what} as a number, like 12 or 12.50`)
		.transform((typed) => Number(typed.replace(',', '.')));

/** Kinds as people call them, one to a line. */
const kindsSaid = z.string().transform((typed, issues) => {
	const lines = typed.split(/[\n;]/).map((line) => line.trim());
	return lines.filter(Boolean).flatMap((line) => {
		const [found] = matchKinds(line);
		if (found) return [found.kind.id];
		issues.addIssue(`No kind goes by “${line.slice(0, 40)}”. Type it another way, one to a line`);
		return [];
	});
});

const ticked = z
	.union([z.string(), z.array(z.string())])
	.transform((one) => (typeof one === 'string' ? [one] : one))
	.pipe(uses);

/** The same as a form types it: money as decimals, nothing typed is nothing known. */
const typed = {
	litres: figure('the litres')
		.refine((litres) => litres > 0, 'Enter the litres as a number above 0')
		.optional(),
	loadKg: figure('the kilograms')
		.refine((kilos) => kilos > 0, 'Enter the kilograms as a number above 0')
		.optional(),
	yearlyCost: figure('the cost a year').optional(),
	uses: ticked.default([])
};
const asked = { ...typed, kinds: kindsSaid.default([]), red: z.literal('yes').optional() };

const inCents = <T extends { yearlyCost?: number | undefined }>({ yearlyCost, ...rest }: T) => ({
	...rest,
	yearlyCostCents: yearlyCost === undefined ? null : Math.round(yearlyCost * 100)
});
const asKept = <T extends { red?: 'yes' | undefined; litres?: number; loadKg?: number }>(
	form: T
) => ({
	...form,
	red: form.red === 'yes',
	litres: form.litres ?? null,
	loadKg: form.loadKg ?? null
});

export const BinForm = BinInput.omit({ yearlyCostCents: true })
	.extend(asked)
	.transform(inCents)
	.transform(asKept);
export const BinEditForm = BinInput.omit({ yearlyCostCents: true, tag: true })
	.extend({ ...asked, version: z.coerce.number().int() })
	.transform(inCents)
	.transform(asKept);

export const BinAgain = z.object({ tag: z.string() });

export const MOST_BINS = 300;
const count = (what: string, most: number) =>
	z.coerce
		.number({ error: `Enter how many ${what}` })
		.int(`Enter how many ${what}, as a whole number`)
		.min(1, `Enter how many ${what}: 1 or more`)
		.max(most, `Enter ${most} ${what} or fewer`);
const rack = {
	rack: z
		.string({ error: 'Enter the letters of the rack, like K' })
		.trim()
		.regex(/^[A-Za-z]{1,12}$/, 'Enter the letters of the rack, like K: letters only')
		.transform((letters) => letters.toUpperCase()),
	shelves: count('shelves', 50),
	slots: count('slots', 100),
	size,
	place: words('where it stands', 120).default('')
};

const fitsAtOnce = (rack: { shelves: number; slots: number }) =>
	rack.shelves * rack.slots <= MOST_BINS;
const TOO_MANY = { path: ['slots'], error: `Make ${MOST_BINS} bins at a time or fewer` };

/** A rack of shelves and slots, made in one go; shelf 1 is the floor. */
export const RackInput = z
	.object({
		...rack,
		litres: litres.nullish(),
		loadKg: loadKg.nullish(),
		yearlyCostCents: cents.nullish(),
		uses: uses.optional(),
		/** The floor is kept for heavy things. */
		heavyFloor: z.boolean().default(false)
	})
	.refine(fitsAtOnce, TOO_MANY);
export type RackInput = z.infer<typeof RackInput>;

export const RackForm = z
	.object({ ...rack, ...typed, heavyFloor: z.literal('yes').optional() })
	.transform(inCents)
	.transform((form) => ({ ...form, heavyFloor: form.heavyFloor === 'yes' }))
	.refine(fitsAtOnce, TOO_MANY);

export const Merge = z.object({
	into: z
		.string({ error: 'Type the address of the bin that takes what is in this one' })
		.trim()
		.min(1)
		.max(40)
});
export type Merge = z.infer<typeof Merge>;
