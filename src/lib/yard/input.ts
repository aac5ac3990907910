import { SCRAP_CLASSES } from '$lib/trade';
import { z } from 'zod';
import { MoveInput } from '../donors/input';
import { ticks } from '../parts/typed';
import { DRAINED_IDS, WASTES, WASTE_WAYS } from './words';

const words = (what: string, most: number) =>
	z.string().trim().max(most, `Keep ${what} under ${most} characters`);
const day = z.iso.date({ error: 'Enter the day, like 2026-03-12' });
const scrapClass = z.enum(SCRAP_CLASSES.map(({ id }) => id) as [string, ...string[]], {
	error: 'Choose the scrap class from the list'
});
const drained = ticks.pipe(z.array(z.enum(DRAINED_IDS as [string, ...string[]])));
const grams = z
	.number({ error: 'Enter the weight' })
	.int()
	.positive('Enter a weight above 0')
	.max(50_000_000, 'Enter a weight up to 50 tonnes');

/** Kilograms as typed, in grams. */
const kilos = (what: string) =>
	z
		.string({ error: `Enter ${what} in kilograms` })
		.trim()
		.regex(/^\d{1,5}([.,]\d{1,3})?$/, `Enter ${what} in kilograms, like 21.5`)
		.transform((typed) => Math.round(Number(typed.replace(',', '.')) * 1000))
		.pipe(grams);

/** What is left of a donor when it is stripped. */
export const Finish = z.object({ grams, scrapClass, drained: drained.default([]) });
export type Finish = z.infer<typeof Finish>;

/** The same from outside, where the weight may be left out. */
export const FinishCall = MoveInput.extend(Finish.partial().shape).refine(
	({ grams, scrapClass }) => (grams === undefined) === (scrapClass === undefined),
	{ error: 'Give the weight and its scrap class together', path: ['grams'] }
);

export const FinishForm = z
	.object({ kilos: kilos('the weight'), scrapClass, drained: drained.optional() })
	.transform(({ kilos, scrapClass, drained = [] }) => ({ grams: kilos, scrapClass, drained }));

export const Load = z.object({
	scrapClass,
	grams,
	cents: z.int({ error: 'Enter what it brought in whole cents' }).min(0).max(100_000_000)
});
export type Load = z.infer<typeof Load>;

/** A trip to the scrap buyer. */
export const ScrapRun = z.object({
	on: day.optional(),
	buyer: words('the buyer', 120).min(1, 'Say who bought it'),
	ticket: words('the number of the weigh ticket', 60).default(''),
	note: words('the note', 500).default(''),
	donors: ticks.default([]),
	loads: z.array(Load).min(1, 'Enter the kilograms of one class at least')
});
export type ScrapRun = z.infer<typeof ScrapRun>;

export const TakeBackRun = z.object({
	reason: words('the reason', 300).min(1, 'Say why the run is taken back')
});
export type TakeBackRun = z.infer<typeof TakeBackRun>;

const litres = z
	.string({ error: 'Enter the litres' })
	.trim()
	.regex(/^\d{1,5}([.,]\d{1,3})?$/, 'Enter the litres as a number, like 1.5')
	.transform((typed) => Math.round(Number(typed.replace(',', '.')) * 1000));

const entry = {
	what: z.enum(WASTES, { error: 'Choose what it is' }),
	way: z.enum(WASTE_WAYS, { error: 'Choose whether it came in or was taken away' }),
	on: day.optional(),
	who: words('who took it', 120).default(''),
	ticket: words('the ticket', 60).default(''),
	note: words('the note', 300).default('')
};
const millilitres = z
	.int()
	.positive('Enter the litres, above 0')
	.max(10_000_000, 'Enter up to 10000 litres');

/** Used oil, old fuel: what went into the can, or who took it away. */
export const WasteEntry = z.object({ ...entry, millilitres });
export type WasteEntry = z.infer<typeof WasteEntry>;

export const WasteForm = z
	.object({ ...entry, litres: litres.pipe(millilitres) })
	.transform(({ litres, ...rest }) => ({ ...rest, millilitres: litres }));

export const WasteRef = z.object({ id: z.coerce.number().int().positive() });
