import { z } from 'zod';
import { ROLES } from './role';
import { SEASONS, UNITS } from './settings';

/** A key made by the sender, so that the same change sent twice is done once. */
export const OnceKey = z.string().min(8).max(200);

export const Email = z
	.string({ error: 'Enter an e-mail address' })
	.trim()
	.toLowerCase()
	.pipe(z.email('Enter an e-mail address like name@shop.example'));

const name = (what: string, most: number) =>
	z
		.string({ error: `Enter ${what}` })
		.trim()
		.min(1, `Enter ${what}`)
		.max(most, `Keep ${what} under ${most} characters`);

const password = z.string({ error: 'Enter a password of 15 characters or more' });

const currency = z
	.string({ error: 'Choose a currency' })
	.refine((code) => currencies().includes(code), 'Choose a currency from the list');

const timeZone = z
	.string({ error: 'Choose a time zone' })
	.refine((zone) => timeZones().includes(zone), 'Choose a time zone from the list');

export const currencies = () => Intl.supportedValuesOf('currency');
export const timeZones = () => ['UTC', ...Intl.supportedValuesOf('timeZone')];

export const SignUp = z.object({
	shopName: name('the name of the shop', 80),
	yourName: name('your name', 80),
	email: Email,
	password,
	currency,
	timeZone,
	units: z.enum(UNITS, { error: 'Choose inch or mm' })
});
export type SignUp = z.infer<typeof SignUp>;

export const ShopEdit = z.object({
	name: name('the name of the shop', 80),
	currency,
	timeZone,
	units: z.enum(UNITS, { error: 'Choose inch or mm' }),
	season: z.enum(SEASONS, { error: 'Choose the season' }),
	version: z.coerce.number().int()
});
export type ShopEdit = z.infer<typeof ShopEdit>;

export const SeasonSwitch = z.object({ season: z.enum(SEASONS, { error: 'Choose the season' }) });

const role = z.enum(ROLES, { error: 'Choose a role' });

export const InviteInput = z.object({ email: Email, role });
export type InviteInput = z.infer<typeof InviteInput>;

export const AcceptInput = z.object({
	yourName: name('your name', 80),
	/** Empty when the person is signed in already. */
	password: z.string().optional()
});

export const MemberEdit = z.object({
	memberId: z.coerce.number().int(),
	version: z.coerce.number().int(),
	role: role.optional(),
	disabled: z.enum(['yes', 'no']).optional()
});
export type MemberEdit = z.infer<typeof MemberEdit>;

export const KeyInput = z.object({ name: name('what the key is for', 60), role });
export const RowInput = z.object({ id: z.coerce.number().int() });
export const PasswordChange = z.object({ password });
