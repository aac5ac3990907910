import { z } from 'zod';
import { engineKey, numberKey } from '../codes/number';

const text = (most: number) => z.string().trim().max(most, `Keep it under ${most} characters`);

/** A part was tried on an engine: it fits, or it does not and why. */
export const FitNote = z
	.object({
		engine: text(120).refine(
			(typed) => engineKey(typed).length > 1,
			'Enter the engine that it was tried on: maker and model'
		),
		fits: z.enum(['yes', 'no'], { error: 'Choose whether it fits' }),
		because: text(200).default(''),
		ways: z.enum(['one', 'both'], { error: 'Choose one way or both' }).default('one')
	})
	.refine(({ fits, because }) => fits === 'yes' || because !== '', {
		path: ['because'],
		error: 'Say why it does not fit'
	});
export type FitNote = z.infer<typeof FitNote>;

const number = (said: string) => text(60).refine((typed) => numberKey(typed).length > 2, said);

/** One number is replaced by another. */
export const Replaced = z
	.object({
		number: number('Enter the number that is replaced'),
		by: number('Enter the number that takes its place'),
		ways: z.enum(['one', 'both'], { error: 'Choose one way or both' }).default('one'),
		note: text(200).default('')
	})
	.refine(({ number, by }) => numberKey(number) !== numberKey(by), {
		path: ['by'],
		error: 'Enter another number: this is the same one'
	});
export type Replaced = z.infer<typeof Replaced>;

/** A note about what a part fits, as its page shows it. */
export interface FitView {
	id: number;
	engine: string;
	fits: boolean;
	because: string;
	bothWays: boolean;
	by: string;
	at: Date;
}

export interface ReplacedView {
	id: number;
	oldNumber: string;
	newNumber: string;
	bothWays: boolean;
	note: string;
}
