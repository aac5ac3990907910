import { BinEdit, Merge, RackInput } from '$lib/bins/input';
import { Nothing } from '$lib/parts/input';
import { Answer, Here, StartWalk, Stop } from '$lib/walks/input';
import { OUTCOMES, WALKS } from '$lib/walks/words';
import { cents, moment, PartItem, text } from './answers';
import { Bin } from './answers-around';
import { z, type Row } from './row';

const BinWhole = Bin.extend({
	contents: z.array(
		z.object({
			...{ tag: text, kind: text, kindName: text, label: text, grade: text, state: text },
			...{ engine: text, pulledAt: moment, testedAt: moment.nullable() }
		})
	),
	lastCounted: moment.nullable(),
	history: z.array(
		z.object({ id: z.int(), at: moment, by: text, said: text, undo: z.boolean() })
	)
}).openapi('BinWhole');

const WalkItem = z
	.object({
		id: z.int(),
		what: z.enum(WALKS),
		by: text,
		startedAt: moment,
		endedAt: moment.nullable(),
		total: z.int(),
		done: z.int()
	})
	.openapi('WalkItem');
const place = z.object({
	id: z.int().describe('Id of the bin; 0 for what lies in none'),
	address: text.nullable(),
	place: text,
	red: z.boolean(),
	total: z.int(),
	open: z.int()
});
const outcome = z.enum(OUTCOMES);
const WalkWhole = WalkItem.extend({
	places: z.array(place).describe('In walking order'),
	at: place.nullable().describe('The place whose stops are given; null: all, the walk is over'),
	stops: z.array(
		z.object({
			n: z.int(),
			part: PartItem.nullable().describe('Null: nothing should lie here'),
			tag: text.nullable(),
			kindName: text,
			why: text,
			outcome: outcome.nullable(),
			note: text,
			by: text.nullable(),
			at: moment.nullable()
		})
	),
	tally: z.array(z.object({ outcome, count: z.int() })),
	kilos: z.array(
		z.object({ scrapClass: text, said: text, parts: z.int(), grams: z.number(), cents })
	)
}).openapi('Walk');

const bin = '/bins/{bin}';
const walk = '/walks/{walk}';
const post = (path: string, said: string, body: z.ZodType, gives: z.ZodType): Row => ({
	...{ method: 'post', path, said, may: 'work', body, gives, shut: true }
});

export const walks: Row[] = [
	{
		...post(
			'/racks',
			'Makes a rack of bins in one go; places that are bins already stay as they are',
			RackInput,
			z.object({ rack: text, made: z.array(text), there: z.int(), eventId: z.int() })
		),
		status: 201
	},
	{
		method: 'get',
		path: bin,
		said: 'One bin, what lies in it, its room and its history',
		may: 'see',
		gives: BinWhole
	},
	{
		method: 'patch',
		path: bin,
		said: 'Changes a bin; another address renames it, its tag stays',
		may: 'work',
		body: BinEdit,
		gives: BinWhole,
		shut: true
	},
	post(
		`${bin}/retire`,
		'Takes an empty bin out of use',
		Nothing,
		z.object({ tag: text, address: text, eventId: z.int() })
	),
	post(`${bin}/again`, 'Uses a retired bin again, by its tag', Nothing, BinWhole),
	post(
		`${bin}/merge`,
		'Moves all parts of a bin into another and takes it out of use',
		Merge,
		z.object({ address: text, moved: z.int(), eventId: z.int() })
	),
	{
		method: 'get',
		path: '/parts/{part}/places',
		said: 'Where a part is best put, with why',
		may: 'see',
		gives: z.object({ items: z.array(z.object({ address: text, why: text, parts: z.int() })) })
	},
	{
		method: 'get',
		path: '/walks',
		said: 'The walks that go on, and the last that are over',
		may: 'see',
		gives: z.object({ open: z.array(WalkItem), over: z.array(WalkItem) })
	},
	{ ...post('/walks', 'Begins a walk', StartWalk, WalkWhole), status: 201 },
	{
		method: 'get',
		path: walk,
		said: 'A walk with the stops of one place',
		may: 'see',
		query: z.object({ at: z.coerce.number().int().optional() }),
		gives: WalkWhole
	},
	post(
		`${walk}/stops`,
		'Says what was found at a stop; what follows for the part is done',
		Answer,
		z.object({ n: z.int(), outcome, note: text })
	),
	post(
		`${walk}/here`,
		'Puts a part right that lies where it does not belong',
		Here,
		z.object({ tag: text, note: text, n: z.int() })
	),
	post(
		`${walk}/undo`,
		'Takes back what was said at a stop, and what it did',
		Stop,
		z.object({ stop: z.int() })
	),
	post(`${walk}/end`, 'Leaves a walk where it is', Nothing, WalkWhole),
	post(`${walk}/again`, 'Goes on with a walk that was left', Nothing, WalkWhole)
];
