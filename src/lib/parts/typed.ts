import { z } from 'zod';
import { isKindId } from '../trade';
import { GRADES } from './words';

export const words = (most: number) =>
	z.string().trim().max(most, `Keep it under ${most} characters`);
export const said = (ask: string, most = 120) =>
	z.string({ error: ask }).trim().min(1, ask).max(most, `Keep it under ${most} characters`);

export const kindId = z
	.string({ error: 'Choose what kind of part it is' })
	.refine(isKindId, 'Choose a kind from the list');
export const grade = z.enum(GRADES, { error: 'Choose a grade' });
export const bin = said('Type the address of the bin, or scan it', 40);
export const grams = z.coerce
	.number({ error: 'Enter the mass in grams' })
	.int('Enter whole grams')
	.min(1, 'Enter the mass in grams')
	.max(200_000, 'Enter the mass in grams, up to 200 kg');
export const version = z.coerce.number({ error: 'Reload the page and save again' }).int();

/** A list as JSON sends it, or one field with commas or new lines between. */
export const numbers = z
	.union([z.string(), z.array(z.string())])
	.transform((typed) => (typeof typed === 'string' ? typed.split(/[,;\n]/) : typed))
	.pipe(z.array(z.string().trim().max(60, 'Keep each part number under 60 characters')))
	.transform((list) => [...new Set(list.filter((number) => number !== ''))])
	.pipe(z.array(z.string()).max(20, 'Keep it to 20 part numbers'));

/** Ticks: one alone arrives as a word. */
export const ticks = z
	.union([z.string(), z.array(z.string())])
	.transform((ticked) => (typeof ticked === 'string' ? [ticked] : ticked));

export const yesNo = z
	.union([z.boolean(), z.enum(['yes', 'no', 'true', 'false', 'on'])])
	.transform((typed) => typed === true || typed === 'yes' || typed === 'true' || typed === 'on');
