import { z } from 'zod';
import { BIN_SIZES } from './size';

const words = (what: string, most: number) =>
	z.string().trim().max(most, `Keep ${what} under ${most} characters`);

const address = z
	.string({ error: 'Enter the address, like K3-1' })
	.trim()
	.min(1, 'Enter the address, like K3-1')
	.max(40, 'Keep the address under 40 characters');

const cents = z.number().int().min(0).max(100_000_000);

export const BinInput = z.object({
	address,
	size: z.enum(BIN_SIZES, { error: 'Choose the size' }),
	litres: z.number().positive('Enter the litres as a number above 0').max(100_000).nullish(),
	yearlyCostCents: cents.nullish(),
	purpose: words('what it is for', 200).default(''),
	place: words('where it stands', 120).default(''),
	red: z.boolean().default(false)
});
export type BinInput = z.infer<typeof BinInput>;

export const BinEdit = BinInput.extend({ version: z.number().int() });
export type BinEdit = z.infer<typeof BinEdit>;

const figure = (what: string) =>
	z
		.string()
		.trim()
		.regex(/^\d{1,7}([.,]\d{1,2})?$/, `Enter ${what} as a number, like 12 or 12.50`)
		.transform((typed) => Number(typed.replace(',', '.')));

/** The same as a form types it: money as decimals, nothing typed is nothing known. */
const typed = {
	litres: figure('the litres')
		.refine((litres) => litres > 0, 'Enter the litres as a number above 0')
		.optional(),
	yearlyCost: figure('the cost a year').optional(),
	red: z.literal('yes').optional()
};

interface Typed {
	yearlyCost?: number | undefined;
	red?: 'yes' | undefined;
}

const inCents = <T extends Typed>({ yearlyCost, red, ...rest }: T) => ({
	...rest,
	red: red === 'yes',
	yearlyCostCents: yearlyCost === undefined ? null : Math.round(yearlyCost * 100)
});

export const BinForm = BinInput.omit({ yearlyCostCents: true }).extend(typed).transform(inCents);
export const BinEditForm = BinInput.omit({ yearlyCostCents: true })
	.extend({ ...typed, version: z.coerce.number().int() })
	.transform(inCents);

export const BinAgain = z.object({ tag: z.string() });
