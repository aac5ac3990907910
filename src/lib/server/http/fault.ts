import { DrizzleQueryError } from 'drizzle-orm';
import { NotFound, Refused, type RefusalCode } from '$lib/refusal';
import { z } from 'zod';

const STATUS: Record<RefusalCode, number> = {
	'bad input': 400,
	role: 403,
	taken: 409,
	changed: 409,
	gate: 409,
	'key reused': 422,
	'too many': 429
};

export interface Problem {
	field: string;
	message: string;
}

export interface Fault {
	status: number;
	code: string;
	problems: Problem[];
}

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** Zod's own sentences name types; people are told which field to look at. */
function sentence(issue: z.core.$ZodIssue): string {
	const field = issue.path.join('.');
	if (!issue.message.startsWith('Invalid') && !issue.message.startsWith('Unrecognized'))
		return issue.message;
	if (issue.code === 'invalid_value') return `Choose one of: ${issue.values.join(', ')}`;
	if (issue.code === 'unrecognized_keys') return `Not known here: ${issue.keys.join(', ')}`;
	return field
		? `Enter ${field} as ${'expected' in issue ? issue.expected : 'described'}`
		: 'Send the fields as JSON';
}

export const FAULT_SAID = 'Something went wrong on our side. Nothing you saved is lost; try again.';

/** Figures, days and characters that no column holds: what checked them let something through. */
const BEYOND = ['22003', '22007', '22008', '22021', '22P02', '22P05'];

const isBeyond = (thrown: unknown) =>
	thrown instanceof DrizzleQueryError &&
	BEYOND.includes(`${(thrown.cause as { code?: string } | undefined)?.code}`);

/** The three fates of an error: known refusals and bad input become words, the rest is thrown on. */
export function faultOf(thrown: unknown): Fault {
	if (thrown instanceof Refused)
		return {
			status: STATUS[thrown.code],
			code: thrown.code,
			problems: [{ field: thrown.field ?? '', message: thrown.message }]
		};
	if (thrown instanceof NotFound)
		return { status: 404, code: 'not found', problems: [{ field: '', message: thrown.message }] };
	if (thrown instanceof z.ZodError)
		return {
			status: 400,
			code: 'bad input',
			problems: thrown.issues.map((issue) => ({
				field: issue.path.join('.'),
				message: capital(sentence(issue))
			}))
		};
	if (isBeyond(thrown))
		return {
			status: 400,
			code: 'bad input',
			problems: [
				{
					field: '',
					message:
						'A figure, day or character in this cannot be kept. Look at each and send it again.'
				}
			]
		};
	throw thrown;
}
