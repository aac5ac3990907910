import { FinishCall, ScrapRun, TakeBackRun, WasteEntry } from '$lib/yard/input';
import { WASTES, WASTE_WAYS } from '$lib/yard/words';
import { cents, moment, text } from './answers';
import { Donor } from './answers-around';
import { z, type Row } from './row';

const day = z.iso.date();
const grams = z.int().describe('Grams');
const picture = z.int().nullable().describe('Id of the photo');

const RunItem = z
	.object({
		number: z.int(),
		on: day,
		buyer: text,
		ticket: text,
		grams,
		cents,
		donors: z.array(text),
		by: text,
		takenBack: z.object({ at: moment, because: text }).nullable()
	})
	.openapi('ScrapRunItem');

const Run = RunItem.extend({
	note: text,
	photo: picture,
	loads: z.array(z.object({ scrapClass: text, said: text, grams, cents }))
}).openapi('ScrapRun');

const Waste = z
	.object({
		items: z.array(
			z.object({
				id: z.int(),
				what: z.enum(WASTES),
				way: z.enum(WASTE_WAYS),
				millilitres: z.int(),
				on: day,
				who: text,
				ticket: text,
				note: text,
				by: text,
				corrects: z.int().nullable().describe('Id of the entry that this one puts right'),
				corrected: z.boolean()
			})
		),
		standing: z.array(z.object({ what: z.enum(WASTES), millilitres: z.int() }))
	})
	.openapi('WasteLog');

const Entry = z
	.object({
		number: z.int().describe('Consecutive in the shop'),
		at: moment,
		on: day,
		donor: text,
		engine: text.describe('As it was taken in'),
		serial: text,
		route: text,
		document: text,
		fromName: text,
		fromAddress: text,
		idSeen: text,
		holdUntil: day.nullable(),
		because: text,
		paidCents: cents.nullable().describe('Null for those who may not see costs'),
		photo: picture,
		by: text,
		replaced: z.boolean().describe('A newer entry stands in its place')
	})
	.openapi('RegisterEntry');

const page = z.object({ cursor: z.coerce.number().int().optional() });
const next = z.int().nullable();

/** What leaves as scrap, and the book of what came in. */
export const yard: Row[] = [
	{
		method: 'post',
		path: '/donors/{donor}/finish',
		said: 'Says that it is stripped, with what is left of it where that was weighed',
		may: 'work',
		body: FinishCall,
		gives: Donor,
		shut: true
	},
	{
		method: 'get',
		path: '/scrap-runs',
		said: 'Trips to the scrap buyer, the newest first',
		may: 'work',
		query: page,
		gives: z.object({ items: z.array(RunItem), next })
	},
	{
		method: 'post',
		path: '/scrap-runs',
		said: 'Writes down a trip: kilos and money by class, and the donors that it closes',
		may: 'work',
		body: ScrapRun,
		status: 201,
		gives: Run,
		shut: true
	},
	{
		method: 'get',
		path: '/scrap-runs/{run}',
		said: 'One trip',
		may: 'work',
		gives: Run
	},
	{
		method: 'post',
		path: '/scrap-runs/{run}/take-back',
		said: 'Takes back a trip that was written down wrongly; its donors come back',
		may: 'work',
		body: TakeBackRun,
		gives: Run,
		shut: true
	},
	{
		method: 'get',
		path: '/waste',
		said: 'Used oil and old fuel: the log, and what should be in the cans',
		may: 'work',
		gives: Waste
	},
	{
		method: 'post',
		path: '/waste',
		said: 'Writes down what went into a can, or who took it away',
		may: 'work',
		body: WasteEntry,
		status: 201,
		gives: z.object({ id: z.int() })
	},
	{
		method: 'post',
		path: '/waste/{id}/correct',
		said: 'Takes a wrong entry out of the sums',
		may: 'work',
		body: z.object({}),
		gives: Waste,
		shut: true
	},
	{
		method: 'get',
		path: '/register',
		said: 'The book of releases, the newest first',
		may: 'work',
		query: page.extend({
			q: z.string().optional().describe('A piece of a serial, or a donor'),
			from: day.optional(),
			to: day.optional()
		}),
		gives: z.object({ items: z.array(Entry), next })
	}
];
