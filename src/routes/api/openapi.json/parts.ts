import { ShotInput } from '$lib/donors/input';
import { FindQuery } from '$lib/find/input';
import { FitNote, Replaced } from '$lib/parts/fits';
import {
	Clean,
	Edit,
	Fit,
	Hold,
	Move,
	Nothing,
	OldStock,
	Proof,
	Scrap,
	Sell,
	TakeBack,
	UndoPart
} from '$lib/parts/input';
import type { Ability } from '$lib/people/role';
import { moment, Part, PartItem, Photo, VerdictWithSources } from './answers';
import { z, type Row } from './row';

const one = '/parts/{part}';
const verb = (name: string, may: Ability, body: z.ZodType, said: string): Row => ({
	method: 'post',
	path: `${one}/${name}`,
	said,
	may,
	body,
	gives: Part,
	shut: true
});

const facet = z.array(
	z.object({ value: z.string(), count: z.int(), said: z.string().optional() })
);
const kindNamed = z.object({ kind: z.string(), kindName: z.string() });
const FoundItem = PartItem.extend({
	reason: z.string().nullable().describe('Why it answers, where its kind does not say it'),
	heldUntil: z.string().nullable(),
	out: z
		.object({ as: z.enum(['fitted', 'sold']), to: z.string().nullable(), on: z.string() })
		.nullable(),
	group: z
		.object({ same: z.string(), count: z.int() })
		.nullable()
		.describe('How many of the same thing answer')
}).openapi('FoundItem');
const Found = z.object({
	items: z.array(FoundItem),
	total: z.int(),
	facets: z.object({
		...{ kind: facet, grade: facet, state: facet, bin: facet },
		...{ engine: facet, price: facet, proof: facet }
	}),
	donors: z
		.array(
			z.object({
				number: z.string(),
				engine: z.string(),
				minutes: z.number(),
				kind: z.string(),
				kindName: z.string(),
				state: z.string()
			})
		)
		.describe('Donors that still carry one, with the minutes to pull it'),
	gone: z.array(FoundItem).describe('Parts that went out and would have answered, the last first'),
	nearest: z.array(kindNamed.extend({ count: z.int() })),
	ask: z
		.object({ kinds: z.array(kindNamed) })
		.nullable()
		.describe('Kinds that one typed word may mean'),
	said: z
		.array(z.object({ name: z.enum(['price', 'proof', 'grade']), value: z.string() }))
		.describe('Filters that were said in words'),
	without: z.array(z.string()).describe('Words that no part has: the answer is what was named without them'),
	next: z.string().nullable()
});

const Fits = z.object({
	items: z.array(
		z.object({
			id: z.int(),
			engine: z.string(),
			fits: z.boolean(),
			because: z.string(),
			bothWays: z.boolean(),
			by: z.string(),
			at: moment
		})
	)
});
const ReplacedNumbers = z.object({
	items: z.array(
		z.object({
			id: z.int(),
			oldNumber: z.string(),
			newNumber: z.string(),
			bothWays: z.boolean(),
			note: z.string()
		})
	)
});

export const parts: Row[] = [
	{
		method: 'get',
		path: '/parts',
		said: 'Finds parts by tag, number, kind, engine, bin, donor or words',
		may: 'see',
		query: FindQuery,
		gives: Found
	},
	{
		method: 'post',
		path: '/parts',
		said: 'Logs old stock: a part without a donor',
		may: 'work',
		body: OldStock,
		status: 201,
		gives: Part,
		shut: true
	},
	{ method: 'get', path: one, said: 'One part', may: 'see', gives: Part },
	{
		method: 'patch',
		path: one,
		said: 'Changes what its tag says',
		may: 'work',
		body: Edit,
		gives: Part,
		shut: true
	},
	{
		method: 'get',
		path: `${one}/verdict`,
		said: 'Whether keeping it pays, and why',
		may: 'see',
		gives: VerdictWithSources
	},
	verb('move', 'work', Move, 'Moves it to a bin or a box'),
	verb('hold', 'hold', Hold, 'Keeps it for somebody until a date'),
	verb('free', 'hold', Nothing, 'Lets a held part go again'),
	verb('fit', 'hold', Fit, 'Uses it on a job'),
	verb('sell', 'trade', Sell, 'Sells it over the counter'),
	verb('take-back', 'trade', TakeBack, 'Takes a part back into the red bin'),
	verb('scrap', 'work', Scrap, 'Scraps or destroys it'),
	verb('proof', 'work', Proof, 'Records how it was checked'),
	verb('clean', 'work', Clean, 'Notes an attempt at cleaning it, and whether it came right'),
	verb('undo', 'work', UndoPart, 'Takes back the newest thing that was done with it'),
	verb('miss', 'work', Nothing, 'Says that it is not where it should be'),
	verb('found', 'work', Nothing, 'Says that a missing part is there again'),
	{
		method: 'get',
		path: `${one}/fits`,
		said: 'What it was tried on, with what its like were tried on, the newest first',
		may: 'see',
		gives: Fits
	},
	{
		method: 'post',
		path: `${one}/fits`,
		said: 'Notes that it was tried on an engine: it fits, or it does not and why',
		may: 'work',
		body: FitNote,
		status: 201,
		gives: Fits
	},
	{
		method: 'post',
		path: '/numbers/replaced',
		said: 'Notes that one part number takes the place of another',
		may: 'work',
		body: Replaced,
		status: 201,
		gives: ReplacedNumbers
	},
	{
		method: 'post',
		path: `${one}/photos`,
		said: 'Adds a photo to a part',
		may: 'work',
		form: z.object({}),
		status: 201,
		gives: Photo
	},
	{
		method: 'post',
		path: '/photos',
		said: 'Adds a photo to whatever carries a tag, or to the donor of a number',
		may: 'work',
		form: z.object({ of: z.string().max(40).describe('A tag, or D12'), shot: ShotInput.shape.shot }),
		status: 201,
		gives: Photo
	}
];
