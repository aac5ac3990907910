import type { WantEdit } from '$lib/wants/input';
import { Refused } from '$lib/refusal';
import { and, eq, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow } from '../people';
import { numbered } from './add';
import { matchWant } from './match';
import { changeWant, wantRow, type Done, type WantRow } from './rows';
import { wantMatch } from './tables';

const SAID: Record<string, string> = {
	mostCents: 'the most they pay',
	tellBy: 'how to tell them',
	numbers: 'part numbers'
};

const show = (value: unknown) =>
	Array.isArray(value) ? value.join(', ') || 'nothing' : String(value ?? '') || 'nothing';

type Fields = Omit<WantEdit, 'version'>;

const differing = (row: WantRow, fields: Fields): (keyof Fields)[] =>
	(Object.keys(fields) as (keyof Fields)[]).filter(
		(key) => fields[key] !== undefined && show(fields[key]) !== show(row[key])
	);

/** Everything here is compared anew: what answers is new again, what does so no more is set aside. */
async function matchAfresh(tx: Tx, ctx: Context, row: WantRow): Promise<void> {
	await matchWant(tx, ctx, row, { at: ctx.now, isNew: true });
	await tx
		.update(wantMatch)
		.set({
			droppedAt: sql`case when ${wantMatch.at} < ${ctx.now} then ${ctx.now}::timestamptz end`
		})
		.where(and(eq(wantMatch.shopId, ctx.shopId), eq(wantMatch.wantId, row.id)));
}

/** Changes what is waited for; what is left out stays. Refused with both sides when somebody saved in between. */
export const editWant = (ctx: Context, ref: string, input: WantEdit): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const row = await wantRow(tx, ctx, ref, 'lock');
		const { version, ...fields } = input;
		const keys = differing(row, fields);
		const both = keys.map(
			(key) => `${SAID[key] ?? key} is now ${show(row[key])}, you typed ${show(fields[key])}`
		);
		if (version !== row.version)
			throw new Refused(
				'changed',
				`Somebody saved W${row.number} meanwhile: ${both.join('; ') || 'nothing that you typed differs'}. Look and save again.`
			);
		const set = {
			...Object.fromEntries(keys.map((key) => [key, fields[key]])),
			...(keys.includes('numbers') ? numbered(fields.numbers ?? []) : {})
		} as Partial<WantRow>;
		const next = { ...row, ...set };
		if (!next.kind && next.numberKeys.length === 0)
			throw new Refused('bad input', 'Choose the kind of part, or enter its number', 'kind');
		const done = await changeWant(tx, ctx, row, 'edited', set, { changed: keys });
		if (['kind', 'engine', 'measures', 'numbers'].some((key) => key in set))
			await matchAfresh(tx, ctx, next);
		return done;
	});
