import { BinInput } from '$lib/bins/input';
import { PutAway } from '$lib/parts/input';
import { PHOTO_SIZES } from '$lib/photos/links';
import { PriceInput } from '$lib/prices/input';
import { PRICE_SORTS } from '$lib/prices/view';
import { Part } from './answers';
import { Bin, Donor, Price } from './answers-around';
import { z, type Row } from './row';

const yes = z.literal('yes').optional();
const PriceQuery = z.object({
	q: z.string().optional(),
	kind: z.string().optional(),
	stale: yes,
	sort: z.enum(PRICE_SORTS).optional(),
	down: yes,
	limit: z.coerce.number().int().optional(),
	cursor: z.string().optional()
});
const code = z.string();

export const shelf: Row[] = [
	{
		method: 'get',
		path: '/bins',
		said: 'The bins and what each holds',
		may: 'see',
		gives: z.object({ items: z.array(Bin) })
	},
	{
		method: 'post',
		path: '/bins',
		said: 'Adds a bin',
		may: 'work',
		body: BinInput,
		status: 201,
		gives: Bin
	},
	{
		method: 'get',
		path: '/prices',
		said: 'What new parts and copies cost',
		may: 'see',
		query: PriceQuery,
		gives: z.object({ items: z.array(Price), next: z.string().nullable() })
	},
	{
		method: 'put',
		path: '/prices',
		said: 'Sets the price of a kind on an engine, or of a part number',
		may: 'trade',
		body: PriceInput,
		gives: Price,
		shut: true
	},
	{
		method: 'get',
		path: '/tags/{tag}',
		said: 'What a tag stands for',
		may: 'see',
		gives: z.union([
			z.object({ what: z.literal('part'), code, part: Part }),
			z.object({ what: z.literal('bin'), code, bin: Bin }),
			z.object({ what: z.literal('box'), code, donor: Donor }),
			z.object({ what: z.literal('blank'), code })
		])
	},
	{
		method: 'post',
		path: '/put-away',
		said: 'Puts several parts into one bin or box; those that may not go there are said',
		may: 'work',
		body: PutAway,
		gives: z.object({
			to: z.string(),
			put: z.array(z.object({ tag: z.string(), eventId: z.number() })),
			there: z.array(z.string()),
			refused: z.array(z.object({ tag: z.string(), said: z.string() }))
		})
	},
	{
		method: 'get',
		path: '/photos/{id}/{size}',
		said: `A photo, in the size ${PHOTO_SIZES.join(', ')}`,
		may: 'see',
		gives: 'picture'
	}
];
