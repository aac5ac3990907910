import { TriageInput } from '$lib/donors/triage';
import { PlanQuestion } from '$lib/parts/choices-form';
import { Leave } from '$lib/parts/input';
import { GRADES, PART_STATES, PROOFS } from '$lib/parts/words';
import { cents, moment, text } from './answers';
import { z, type Row } from './row';

const one = '/donors/{donor}';
const names = z.array(text);
const tried = z.object({ passed: z.boolean(), figure: z.number().nullable(), unit: text });

const Triage = z
	.object({
		answers: z.record(z.string(), z.union([text, names])).describe('By question'),
		inPlace: z.record(z.string(), tried).describe('What was tried before it was opened, by kind'),
		by: text.nullable(),
		at: moment.nullable(),
		version: z.int(),
		undo: z.int().nullable()
	})
	.openapi('Triage');

const BenchKind = z
	.object({
		...{ kind: text, kindName: text, system: text },
		machine: z.boolean().describe('Of the machine around the engine'),
		plan: z.enum(['keep', 'way']).nullable().describe('Null: below the stop line'),
		planSaid: text.nullable(),
		goesWith: text.nullable(),
		pieces: names,
		minutes: z.number(),
		minutesAll: z.number().describe('With what still stands before it'),
		...{ behind: names, ruins: names, gainCents: cents, verdict: text },
		...{ chance: z.number(), level: text, why: names, waitingFor: text.nullable() },
		have: z.int(),
		keepUpTo: z.int().nullable(),
		howTested: text,
		fields: z
			.array(
				z.object({
					...{ id: text, said: text, unit: text },
					...{ least: z.number().optional(), most: z.number().optional() }
				})
			)
			.describe('What its test reads, with the bounds of the shop'),
		...{ hot: z.boolean(), checklist: names, set: names, never: text.nullable() },
		proof: tried.extend({ how: z.enum(PROOFS) }).nullable(),
		grades: z.record(z.string(), z.enum(GRADES)).describe('By how it was checked')
	})
	.openapi('BenchKind');

const Bench = z
	.object({
		asOf: moment,
		...{ number: text, engine: text, causeSaid: text, offMachine: text, state: text },
		open: z.union([z.literal(true), text]).describe('True, or why no part may be pulled'),
		minutesAtHand: z.number().nullable(),
		planMinutes: z.number(),
		planCents: z.number(),
		kinds: z.array(BenchKind).describe('In the order of work, then what is below the stop line'),
		leftOn: z.array(z.object({ kind: text, kindName: text, by: text })),
		done: z
			.array(
				z.object({
					...{ tag: text, kind: text, kindName: text, grade: z.enum(GRADES) },
					...{ state: z.enum(PART_STATES), place: text.nullable(), destroyed: z.boolean() },
					...{ by: text, mine: z.boolean(), at: moment },
					undo: z.int().nullable().describe('The event that can still be taken back')
				})
			)
			.describe('What came off, the newest first, up to thirty'),
		logged: z.int()
	})
	.openapi('Bench');

const leave = (name: string, said: string): Row => ({
	...{ method: 'post', path: `${one}/${name}`, said, may: 'work' },
	...{ body: Leave, gives: z.object({ kind: text }), shut: true }
});

/** A donor at the bench: the first look, what to take off next, what was left on. */
export const bench: Row[] = [
	{
		...{ method: 'get', path: `${one}/triage`, may: 'see', gives: Triage },
		said: 'What the first minute at the tailgate showed'
	},
	{
		...{ method: 'post', path: `${one}/triage`, may: 'work', gives: Triage, shut: true },
		body: TriageInput,
		said: 'Keeps what the first minute showed'
	},
	{
		...{ method: 'get', path: `${one}/bench`, may: 'work', query: PlanQuestion, gives: Bench },
		said: 'What to take off next, with all that the bench needs to know of each kind'
	},
	{
		...{ method: 'get', path: `${one}/bench/live`, may: 'work', gives: 'stream' },
		said: 'Says "changed" each time something came off, was left on or taken back'
	},
	leave('leave', 'Leaves a kind on its donor: the plan counts nothing for it'),
	leave('take-up', 'Puts a kind that was left on back on the plan')
];
