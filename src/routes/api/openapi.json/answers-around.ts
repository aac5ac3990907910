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
		photo: links.nullable()
	})
	.openapi('DonorItem');
export const Donor = DonorItem.extend({
	maker: text,
	model: text,
	typeCode: text,
	serial: text,
	displacementCc: z.number().nullable(),
	fittings: z.array(text),
	secondCause: text.nullable(),
	safeTicks: z.array(text),
	note: text,
	version: z.int(),
	boxes: z.array(z.object({ tag: text })),
	photos: z.array(Photo.extend({ shot: text, alt: text })),
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
		purpose: text,
		place: text,
		red: z.boolean(),
		version: z.int(),
		parts: z.int()
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
