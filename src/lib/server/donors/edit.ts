import type { DonorEdit, SafeInput } from '$lib/donors/input';
import { sayNumber } from '$lib/donors/reference';
import { Refused } from '$lib/refusal';
import { SAFE_TICKS } from '$lib/trade';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow, record } from '../people';
import { announceDonor, saysWhatItCarries } from './announce';
import { donorColumns } from './columns';
import { donorRow, type DonorRow } from './rows';
import { donor } from './tables';

const SAID: Partial<Record<keyof DonorRow, string>> = {
	maker: 'maker',
	model: 'model',
	typeCode: 'type',
	dateCode: 'code',
	serial: 'serial',
	emissionFamily: 'emission family',
	displacementCc: 'displacement',
	shaft: 'shaft',
	engineClass: 'class',
	fittings: 'fittings',
	offMachine: 'machine it came off',
	cause: 'cause of death',
	secondCause: 'second cause',
	sureness: 'how sure',
	note: 'note',
	safeTicks: 'safe ticks'
};

const plain = (value: unknown): string =>
	Array.isArray(value) ? value.join(', ') : `${value ?? ''}`;

const quoted = (value: unknown) => (plain(value) === '' ? 'empty' : `“${plain(value)}”`);

/** Refuses when somebody saved in between, with both values of all that differs. */
function needVersion(row: DonorRow, version: number | undefined, typed: Partial<DonorRow>): void {
	if (version === undefined || version === row.version) return;
	const fields = Object.keys(SAID) as (keyof DonorRow)[];
	const both = fields
		.filter((field) => field in typed && plain(row[field]) !== plain(typed[field]))
		.map(
			(field) => `${SAID[field]} is now ${quoted(row[field])}, you typed ${quoted(typed[field])}`
		);
	throw new Refused(
		'changed',
		`Somebody saved ${sayNumber(row.number)} meanwhile: ${both.join('; ') || 'nothing that you typed differs'}. Look and save again.`
	);
}

/** Writes what was said about a donor, with its event; `more` goes into the event too. Returns the event's number. */
export const saveDonor = (
	ctx: Context,
	ref: string,
	version: number | undefined,
	columns: (row: DonorRow) => Partial<DonorRow>,
	what: string,
	more: (row: DonorRow) => Record<string, unknown> = () => ({})
): Promise<number> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await donorRow(tx, ctx, ref, { lock: true });
		const typed = columns(row);
		needVersion(row, version, typed);
		await tx
			.update(donor)
			.set({ ...typed, version: row.version + 1 })
			.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, row.id)));
		if (saysWhatItCarries(typed)) await announceDonor(tx, ctx, row.id, false);
		const { paidCents: _, searchWords: _words, ...detail } = typed;
		return record(tx, ctx, {
			about: 'donor',
			aboutId: row.id,
			what,
			detail: { ...detail, ...more(row) }
		});
	});

export async function editDonor(ctx: Context, ref: string, input: DonorEdit): Promise<void> {
	const what = input.cause === undefined ? 'edited what it is' : 'named the cause of death';
	await saveDonor(ctx, ref, input.version, (row) => donorColumns(ctx, input, row), what);
}

/** Sets the safe-to-store ticks, in the order they are done. */
export async function tickSafe(ctx: Context, ref: string, input: SafeInput): Promise<void> {
	const ticks = SAFE_TICKS.map((tick) => tick.id).filter((id) => input.ticks.includes(id));
	await saveDonor(ctx, ref, input.version, () => ({ safeTicks: ticks }), 'ticked what is safe');
}
