import { GRADES, PART_STATES, PROOFS } from '$lib/parts/words';
import { z } from './row';

export const text = z.string();
export const cents = z.int().nullable();
export const moment = z.iso.datetime();

export const Fault = z
	.object({
		code: text,
		message: text.describe('What to do, in words'),
		field: text.optional()
	})
	.openapi('Fault');

const verdictWord = z.enum(['keep', 'close call', 'let it go', 'needs a price', 'never']);
export const links = z.object({ thumb: text, card: text, full: text }).openapi('PhotoLinks');
export const Photo = z.object({ id: z.int(), links }).openapi('Photo');

export const PartItem = z
	.object({
		id: z.int(),
		tag: text,
		kind: text,
		kindName: text,
		label: text,
		grade: z.enum(GRADES),
		state: z.enum(PART_STATES),
		bin: text.nullable().describe('Address of the bin, or the box it lies in'),
		donor: text.nullable().describe('D12; null for old stock'),
		engine: text,
		askedCents: cents,
		copyCents: cents,
		newCents: cents,
		verdict: verdictWord.nullable(),
		gainCents: cents,
		photo: text.nullable(),
		heldBy: text.nullable(),
		setMissing: text.describe('What is missing from its set')
	})
	.openapi('PartItem');

const VerdictTerm = z.object({ said: text, value: z.number(), unit: text, source: text });
export const Verdict = z
	.object({
		verdict: verdictWord,
		reason: text.nullable(),
		gainCents: cents,
		timing: z.enum(['when-called', 'now']).nullable(),
		keepUpTo: z.int().nullable(),
		have: z.int(),
		askedCents: cents,
		breakEvenUsedCents: cents,
		breakEvenNewCents: cents,
		waitingFor: text.nullable().describe('Who waits for it, without a name'),
		terms: z.array(VerdictTerm).describe('Empty for those who may not see them')
	})
	.openapi('Verdict');
export const VerdictWithSources = Verdict.extend({ sources: z.array(text) });

const Proof = z.object({
	how: z.enum(PROOFS),
	figure: z.number().nullable(),
	unit: text,
	figures: z.array(z.object({ field: text, value: z.number(), unit: text })),
	passed: z.boolean(),
	note: text,
	by: text,
	at: moment
});
export const Part = PartItem.omit({ photo: true })
	.extend({
		version: z.int(),
		numbers: z.array(text),
		set: text,
		massGrams: z.int().nullable(),
		note: text,
		heldUntil: moment.nullable(),
		outTo: text.nullable(),
		scrapReason: text.nullable(),
		pulledAt: moment,
		proofs: z.array(Proof),
		photos: z.array(Photo.extend({ alt: text, blur: text })),
		worth: Verdict.nullable(),
		next: PartItem.nullable().describe('The next unit that would answer the same call'),
		taken: text.nullable()
	})
	.openapi('Part');

const place = z.number().min(0).max(1).describe('Share of the picture, from the left or from above');
const PinPart = z
	.object({ tag: text, label: text, grade: z.enum(GRADES), state: z.enum(PART_STATES) })
	.extend({ place: text.nullable().describe('Address of its bin, or tag of its box') });
export const Pin = z
	.object({
		id: z.int(),
		photo: z.int(),
		n: z.int().describe('The number on the pin, of its photo alone'),
		x: place,
		y: place,
		kind: text,
		kindName: text,
		part: PinPart.nullable().describe('Null while the kind is still to be pulled')
	})
	.openapi('Pin');
