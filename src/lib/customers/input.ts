import { z } from 'zod';
import { Email } from '../people/input';
import { CUSTOMER_KINDS } from './words';

const words = (most: number) => z.string().trim().max(most, `Keep it under ${most} characters`);

const phone = words(40).refine(
	(typed) => typed === '' || /\d.*\d.*\d/.test(typed),
	'Enter the phone number with its figures, like 555 0142'
);
/** An address, or none. */
const email = z.union([z.literal(''), Email], {
	error: 'Enter an e-mail address like name@mail.example'
});

/** Who somebody is and how to reach them; the name alone will do. */
export const reach = {
	name: z.string({ error: 'Enter the name' }).pipe(words(80).min(1, 'Enter the name')),
	kind: z.enum(CUSTOMER_KINDS, { error: 'Choose customer or neighbour shop' }).default('customer'),
	phone: phone.default(''),
	email: email.default(''),
	note: words(500).default('')
};

export const CustomerInput = z.object(reach);
export type CustomerInput = z.infer<typeof CustomerInput>;

/** All fields at once: what is left out is empty. */
export const CustomerEdit = z.object({
	...reach,
	version: z.coerce.number({ error: 'Reload the page and save again' }).int()
});
export type CustomerEdit = z.infer<typeof CustomerEdit>;

export const Nothing = z.object({});
