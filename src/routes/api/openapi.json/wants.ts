import { CustomerEdit, CustomerInput, Nothing } from '$lib/customers/input';
import { CUSTOMER_KINDS, LETTER_STATES } from '$lib/customers/words';
import { GRADES, PART_STATES } from '$lib/parts/words';
import { TellInput, WantEdit, WantInput, YesInput } from '$lib/wants/input';
import { TELL_BY, WAITERS, WANT_STATES } from '$lib/wants/words';
import { cents, moment, text } from './answers';
import { z, type Row } from './row';

const CustomerItem = z
	.object({
		...{ id: z.int(), name: text, kind: z.enum(CUSTOMER_KINDS), phone: text, email: text },
		waits: z.int().describe('How many of their wants are open')
	})
	.openapi('CustomerItem');
const Letter = z.object({
	...{ id: z.int(), about: text, aboutId: z.int(), to: text, subject: text, text },
	...{ state: z.enum(LETTER_STATES), tries: z.int(), fault: text, by: text },
	...{ writtenAt: moment, sentAt: moment.nullable() }
});
const Customer = CustomerItem.extend({
	note: text,
	lettersOffAt: moment.nullable().describe('Since when they want no letters'),
	...{ erasedAt: moment.nullable(), addedAt: moment, version: z.int() },
	letters: z.array(Letter)
}).openapi('Customer');

const WantItem = z
	.object({
		...{ id: z.int(), number: z.int(), who: z.enum(WAITERS) },
		name: text.describe('The customer, or the job'),
		customerId: z.int().nullable(),
		what: text,
		state: z.enum(WANT_STATES),
		...{ mostCents: cents, addedAt: moment, toldAt: moment.nullable() },
		toldBy: z.enum(TELL_BY).nullable(),
		matches: z.int().describe('How many things here answer it'),
		fresh: z.int().describe('How many of them nobody has looked at'),
		letter: z.enum(LETTER_STATES).nullable()
	})
	.openapi('WantItem');
const Match = z.object({
	id: z.int(),
	rank: z.int().describe('1 by number, 2 by engine, 3 by kind and measures, 4 by kind alone'),
	...{ at: moment, isNew: z.boolean() },
	part: z
		.object({
			...{ tag: text, kindName: text, engine: text, grade: z.enum(GRADES) },
			...{ state: z.enum(PART_STATES), bin: text.nullable(), askedCents: cents },
			heldBy: text.nullable()
		})
		.nullable(),
	donor: z.object({ number: text, engine: text, state: text, minutes: z.number() }).nullable()
});
const Want = WantItem.extend({
	...{ kind: text, engine: text, measures: text, numbers: z.array(text), note: text },
	...{ tellBy: z.enum(TELL_BY), phone: text, email: text, lettersOff: z.boolean() },
	kept: text.nullable().describe('Tag of the part that is kept for them'),
	...{ by: text, version: z.int(), found: z.array(Match) }
}).openapi('Want');
const State = z.object({ number: text, state: z.enum(WANT_STATES), version: z.int() });
const id = z.object({ id: z.int() });
const list = <T extends z.ZodType>(item: T) =>
	z.object({ items: z.array(item), next: text.nullable() });
const page = { limit: z.coerce.number().int().optional(), cursor: text.optional() };

const want = (verb: string, said: string, body: z.ZodType): Row => ({
	...{ method: 'post', path: `/wants/{want}/${verb}`, said, may: 'trade' },
	...{ body, gives: State, shut: true }
});

export const wants: Row[] = [
	{
		...{ method: 'get', path: '/wants', said: 'Who waits, first where something new is here' },
		may: 'trade',
		query: z.object({
			show: z.enum(['open', 'quiet', 'closed']).optional(),
			customer: z.coerce.number().int().optional(),
			...page
		}),
		gives: list(WantItem)
	},
	{
		...{ method: 'post', path: '/wants', said: 'Puts somebody who waits on the list', may: 'trade' },
		...{ body: WantInput, status: 201, gives: z.object({ number: text, matches: z.int() }) }
	},
	{ method: 'get', path: '/wants/{want}', said: 'One want', may: 'trade', gives: Want },
	{
		...{ method: 'patch', path: '/wants/{want}', said: 'Changes what is waited for', may: 'trade' },
		...{ body: WantEdit, gives: State, shut: true }
	},
	want('tell', 'They are told: by letter, which leaves with this, or as it was done', TellInput),
	want('yes', 'They said yes; a part that is named is held for them', YesInput),
	want('no', 'They said no', Nothing),
	want('close', 'They have it', Nothing),
	want('wait', 'They wait on', Nothing),
	{
		...{ method: 'get', path: '/customers', said: 'Customers and neighbour shops', may: 'trade' },
		...{ query: z.object({ q: text.optional(), ...page }), gives: list(CustomerItem) }
	},
	{
		...{ method: 'post', path: '/customers', said: 'Enters a customer', may: 'trade', status: 201 },
		...{ body: CustomerInput, gives: id, shut: true }
	},
	{
		...{ method: 'get', path: '/customers/{customer}', said: 'One customer', may: 'trade' },
		gives: Customer
	},
	{
		...{ method: 'patch', path: '/customers/{customer}', said: 'Changes a customer', may: 'trade' },
		...{ body: CustomerEdit, gives: id.extend({ version: z.int() }), shut: true }
	},
	{
		...{ method: 'delete', path: '/customers/{customer}', may: 'run', body: Nothing, gives: id },
		said: 'Takes name, reach and letters of a customer away; what was sold stays as that of “a customer”'
	}
];
