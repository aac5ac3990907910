import { z } from 'zod';
import { DonorEdit, TakeIn } from './input';

const figure = (say: string) =>
	z
		.string()
		.trim()
		.regex(/^\d{1,7}([.,]\d{1,2})?$/, say)
		.transform((typed) => Number(typed.replace(',', '.')));

const typed = {
	displacementCc: figure('Enter the displacement in cc, as a number like 210').optional(),
	paid: figure('Enter what was paid as a number, like 15 or 15.50').optional()
};

const paidInCents = (paid: number | undefined) =>
	paid === undefined ? {} : { paidCents: Math.round(paid * 100) };

/** Taking in, as the form on the ramp sends it: what is not typed is not known. */
export const TakeInForm = TakeIn.omit({ release: true, paidCents: true })
	.extend({ ...typed, photo: z.unknown().optional() })
	.transform(({ paid, photo: _, ...rest }) => ({ ...rest, ...paidInCents(paid) }));

/** Editing, as the form sends it: what is left empty is emptied. */
export const DonorEditForm = DonorEdit.omit({
	cause: true,
	secondCause: true,
	sureness: true,
	paidCents: true
})
	.extend({ ...typed, version: z.coerce.number().int() })
	.transform(({ paid, ...rest }) => ({
		maker: '',
		model: '',
		typeCode: '',
		dateCode: '',
		serial: '',
		emissionFamily: '',
		offMachine: '',
		note: '',
		displacementCc: null,
		shaft: null,
		class: null,
		...rest,
		...paidInCents(paid)
	}));
