import { BIN_USES } from '$lib/bins/use';
import { DONOR_STATES, RELEASE_ROUTES, SURENESS } from '$lib/donors/words';
import { CAUSES } from '$lib/trade';
import { cents, links, moment, Photo, text } from './answers';
import { z } from './row';

const day = z.iso.date();

const Release = z.object({
	route: z.enum(RELEASE_ROUTES),
	document: text,
	on: day,
	holdUntil: day.nullable(),
	by: text
});
export const DonorItem = z
	.object({
		id: z.int(),
		number: text.describe('D12'),
		tag: text,
		engine: text,
		state: z.enum(DONOR_STATES),
		class: text.nullable(),
		cause: z.enum(CAUSES.map((one) => one.id)).nullable(),
		sureness: z.enum(SURENESS).nullable(),
		offMachine: text,
		takenInAt: moment,
		partCount: z.int(),
		photo: links.nullable(),
		blur: text.describe('The photo as a tiny WebP, in base64')
	})
	.openapi('DonorItem');
export const Donor = DonorItem.extend({
	maker: text,
	model: text,
	typeCode: text,
	serial: text,
	dateCode: text,
	emissionFamily: text.describe('As it stands on the emission label'),
	displacementCc: z.number().nullable(),
	fittings: z.array(text),
	secondCause: text.nullable(),
	safeTicks: z.array(text),
	note: text,
	version: z.int(),
	boxes: z.array(z.object({ tag: text })),
	photos: z.array(Photo.extend({ shot: text, alt: text, blur: text })),
	release: Release.nullable(),
	parts: z.array(z.object({ tag: text, kind: text, kindName: text, grade: text, state: text }))
}).openapi('Donor');

export const Bin = z
	.object({
		id: z.int(),
		tag: text,
		address: text,
		size: text,
		litres: z.number().nullable(),
		loadKg: z.number().nullable(),
		uses: z.array(z.enum(BIN_USES)),
		kinds: z.array(text),
		purpose: text,
		place: text,
		red: z.boolean(),
		version: z.int(),
		parts: z.int(),
		room: z.object({
			holds: z.number().describe('Litres'),
			litres: z.number().describe('Taken, about'),
			grams: z.number(),
			fullness: z.number(),
			flags: z.array(z.object({ flag: text, said: text, why: text }))
		})
	})
	.openapi('Bin');

export const Price = z
	.object({
		id: z.int(),
		kind: text,
		kindName: text,
		engine: text,
		number: text,
		newCents: z.int(),
		copyCents: cents,
		source: text,
		seenOn: day,
		stale: z.boolean(),
		version: z.int()
	})
	.openapi('Price');
