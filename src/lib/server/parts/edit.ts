import { engineKey, numberKey } from '$lib/codes/number';
import type { Edit } from '$lib/parts/input';
import { Refused } from '$lib/refusal';
import { inShop, type Context } from '../context';
import { changePart, partFor, type Done, type PartRow } from './row';

/** Refuses what was typed on an older version, with both sides said. */
export function sameVersion(row: PartRow, version: number, stands: string, typed: string): void {
	if (row.version === version) return;
	throw new Refused(
		'changed',
		`Somebody changed this part meanwhile: it is now ${stands}. You typed ${typed}. Look and save again.`
	);
}

const SAID: Record<string, string> = {
	massGrams: 'mass',
	numbers: 'part numbers',
	setMissing: 'what is missing'
};

const show = (value: unknown) =>
	Array.isArray(value) ? value.join(', ') || 'nothing' : String(value ?? '') || 'nothing';

type Fields = Omit<Edit, 'version'>;

/** Only what differs from what stands there. */
function differing(row: PartRow, fields: Fields): Fields {
	const entries = Object.entries(fields).filter(
		([key, value]) => value !== undefined && show(value) !== show(row[key as keyof Fields])
	);
	return Object.fromEntries(entries);
}

const listed = (keys: string[], of: Record<string, unknown>) =>
	keys.map((key) => `${SAID[key] ?? key}: ${show(of[key])}`).join('; ');

/** Changes what is written about a part. Its engine can be written only on old stock. */
export const editPart = (ctx: Context, tag: string, input: Edit): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'edit');
		const { version, ...fields } = input;
		if (fields.engine !== undefined && row.donorId !== null) delete fields.engine;
		const change = differing(row, fields);
		const keys = Object.keys(change);
		sameVersion(row, version, listed(keys, row), listed(keys, change));
		const { massGrams, ...words } = change;
		const set: Partial<PartRow> = {
			...words,
			...('massGrams' in change ? { massGrams: massGrams ?? null } : {}),
			...(change.numbers ? { numberKeys: keysOf(change.numbers) } : {}),
			...(change.engine === undefined ? {} : { engineKey: engineKey(change.engine) })
		};
		return changePart(tx, ctx, row, 'edit', set, { changed: keys.map((key) => SAID[key] ?? key) });
	});

/** Numbers as they are compared; what has no letter or digit is none. */
export const keysOf = (numbers: readonly string[]): string[] =>
	[...new Set(numbers.map(numberKey))].filter((key) => key !== '');
