import { DonorFilter } from '$lib/donors/filter';
import { AskReading } from '$lib/donors/label-form';
import { DonorEdit, MoveInput, ReleaseInput, ShotInput, TakeIn } from '$lib/donors/input';
import { Pin as PinInput } from '$lib/parts/box/input';
import { Pull } from '$lib/parts/input';
import { Part, Photo, Pin } from './answers';
import { Donor, DonorItem } from './answers-around';
import { LabelReadings } from './label-answers';
import { z, type Row } from './row';

const one = '/donors/{donor}';
const move = (name: string, said: string): Row => ({
	method: 'post',
	path: `${one}/${name}`,
	said,
	may: 'work',
	body: MoveInput,
	gives: Donor,
	shut: true
});

export const donors: Row[] = [
	{
		method: 'get',
		path: '/donors',
		said: 'Donors, the newest first',
		may: 'see',
		query: DonorFilter,
		gives: z.object({
			items: z.array(DonorItem),
			next: z.int().nullable(),
			counts: z.record(z.string(), z.int())
		})
	},
	{
		method: 'post',
		path: '/donors',
		said: 'Takes in a dead engine; a model or a photo is enough',
		may: 'work',
		body: TakeIn,
		status: 201,
		gives: Donor
	},
	{ method: 'get', path: one, said: 'One donor', may: 'see', gives: Donor },
	{
		method: 'patch',
		path: one,
		said: 'Changes what is known of a donor',
		may: 'work',
		body: DonorEdit,
		gives: Donor,
		shut: true
	},
	{
		method: 'post',
		path: `${one}/release`,
		said: 'Records that the shop may take it apart',
		may: 'work',
		body: ReleaseInput,
		gives: Donor
	},
	move('strip', 'Puts it on the bench, once its gates are open'),
	move('park', 'Keeps it whole, for pulling when somebody calls'),
	move('reopen', 'Takes a stripped donor back to the bench'),
	{
		method: 'post',
		path: `${one}/photos`,
		said: 'Adds a photo to a donor',
		may: 'work',
		form: ShotInput,
		status: 201,
		gives: Photo
	},
	{
		method: 'get',
		path: `${one}/pins`,
		said: 'The numbered pins on its photos',
		may: 'see',
		gives: z.object({ items: z.array(Pin) })
	},
	{
		method: 'post',
		path: `${one}/pins`,
		said: 'Sets a pin on one of its photos, for a part or for a kind still on it',
		may: 'work',
		body: PinInput,
		status: 201,
		gives: Pin
	},
	{
		method: 'get',
		path: `${one}/readings`,
		said: 'What was read off its photos: of each the newest, to be accepted or corrected',
		may: 'see',
		gives: LabelReadings
	},
	{
		method: 'post',
		path: `${one}/readings`,
		said: 'Has the text on one of its photos read; done a few seconds later',
		may: 'work',
		body: AskReading,
		status: 201,
		gives: z.object({ id: z.int() })
	},
	{
		method: 'post',
		path: `${one}/parts`,
		said: 'Logs a part pulled from it',
		may: 'work',
		body: Pull,
		status: 201,
		gives: Part,
		shut: true
	}
];
