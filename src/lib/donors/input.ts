import { CAUSES, ENGINE_CLASSES, FITTINGS, SAFE_TICKS } from '$lib/trade';
import { z } from 'zod';
import { BlankTag } from '../tags/input';
import { DONOR_SHOTS, RELEASE_ROUTES, SHAFTS, SURENESS } from './words';

const words = (what: string, most: number) =>
	z.string().trim().max(most, `Keep ${what} under ${most} characters`);

/** One of the ids of a list of the trade's data. */
const idOf = <T extends string>(rows: readonly { id: T }[], error: string) =>
	z.enum(rows.map((row) => row.id) as [T, ...T[]], { error });

const day = (what: string) => z.iso.date(`Enter ${what} as a day, like 2026-03-12`);
const cents = z.number().int().min(0).max(100_000_000);
const cc = z
	.number({ error: 'Enter the displacement in cc, as a number' })
	.positive('Enter the displacement in cc, above 0')
	.max(10_000, 'Enter the displacement in cc, up to 10000');

export const ReleaseInput = z.object({
	route: z.enum(RELEASE_ROUTES, { error: 'Choose by which route the shop may take it apart' }),
	document: words('the document', 200).default(''),
	on: day('the day of the release').optional(),
	holdUntil: day('the hold date').nullish(),
	fromName: words('the name', 120).optional(),
	fromAddress: words('the address', 300).optional(),
	idSeen: words('what was shown', 80).optional(),
	signedWords: words('what was signed', 2000).optional(),
	because: words('the reason', 300).optional()
});
export type ReleaseInput = z.infer<typeof ReleaseInput>;

const cause = idOf(CAUSES, 'Choose the cause of death');
const sureness = z.enum(SURENESS, { error: 'Choose how sure the cause is' });

/** What a donor is. A question mark stands for a character that cannot be read; nothing is corrected. */
const what = {
	maker: words('the maker', 60),
	model: words('the model', 60),
	typeCode: words('the type', 60),
	dateCode: words('the code', 60),
	serial: words('the serial', 60),
	emissionFamily: words('the emission family', 24),
	displacementCc: cc.nullable(),
	shaft: z.enum(SHAFTS, { error: 'Choose horizontal or vertical' }).nullable(),
	class: idOf(ENGINE_CLASSES, 'Choose the class of engine').nullable(),
	fittings: z.array(z.enum(FITTINGS, { error: 'Choose fittings from the list' })).max(5),
	offMachine: words('the machine it came off', 120),
	cause: cause.nullable(),
	secondCause: cause.nullable(),
	sureness: sureness.nullable(),
	paidCents: cents,
	safeTicks: z.array(idOf(SAFE_TICKS, 'Choose ticks from the list')),
	note: words('the note', 2000)
};

export const TakeIn = z.object({ ...what, release: ReleaseInput, tag: BlankTag }).partial();
export type TakeIn = z.infer<typeof TakeIn>;

export const DonorEdit = z.object({ ...what, version: z.number().int() }).partial();
export type DonorEdit = z.infer<typeof DonorEdit>;

export const MoveInput = z.object({ reason: words('the reason', 300).optional() });
export type MoveInput = z.infer<typeof MoveInput>;

export const SafeInput = z.object({
	ticks: z.array(idOf(SAFE_TICKS, 'Choose ticks from the list')),
	version: z.coerce.number().int()
});
export type SafeInput = z.infer<typeof SafeInput>;

export const ShotInput = z.object({
	shot: z.enum(DONOR_SHOTS, { error: 'Choose what the photo shows' }).default('other')
});

export const CauseForm = z.object({
	cause,
	secondCause: cause.nullable().default(null),
	sureness,
	version: z.coerce.number().int()
});

export const PhotoRef = z.object({ id: z.coerce.number().int().positive() });
