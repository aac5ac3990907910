import { sayEngine, sayNumber } from '$lib/donors/reference';
import { date } from '$lib/format';
import { binCaution, boxCaution, partCaution } from '$lib/labels/caution';
import type { Label } from '$lib/labels/label';
import { causeSaid, findKind, isCauseId } from '$lib/trade';
import { and, eq, inArray } from 'drizzle-orm';
import { bin } from '../bins/tables';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { box, donor } from '../donors/tables';
import { part } from '../parts/tables';
import { getShop } from '../people';
import { tag } from '../tags/tables';

type Foot = (day: Date) => string;

async function partLabels(tx: Tx, ctx: Context, codes: string[], foot: Foot): Promise<Label[]> {
	const rows = await tx
		.select({ part, bin: bin.address, donor })
		.from(part)
		.leftJoin(bin, and(eq(bin.shopId, part.shopId), eq(bin.id, part.binId)))
		.leftJoin(donor, and(eq(donor.shopId, part.shopId), eq(donor.id, part.donorId)))
		.where(and(eq(part.shopId, ctx.shopId), inArray(part.tag, codes)));
	return rows.map(({ part, bin, donor }) => ({
		what: 'part',
		code: part.tag,
		name: part.label || (findKind(part.kind)?.name ?? part.kind),
		engine: donor ? sayEngine(donor) : part.engine,
		number: part.numbers[0] ?? '',
		donor: donor && sayNumber(donor.number),
		grade: part.grade,
		bin,
		caution: partCaution(part),
		foot: foot(part.pulledAt)
	}));
}

const said = (cause: string | null) => (cause && isCauseId(cause) ? causeSaid(cause) : '');

async function boxLabels(tx: Tx, ctx: Context, codes: string[], foot: Foot): Promise<Label[]> {
	const rows = await tx
		.select({ code: box.tag, donor })
		.from(box)
		.innerJoin(donor, and(eq(donor.shopId, box.shopId), eq(donor.id, box.donorId)))
		.where(and(eq(box.shopId, ctx.shopId), inArray(box.tag, codes)));
	return rows.map(({ code, donor }) => ({
		what: 'box',
		code,
		number: sayNumber(donor.number),
		engine: sayEngine(donor),
		cause: [said(donor.cause), donor.sureness].filter(Boolean).join(', '),
		caution: boxCaution(donor.state, donor.safeTicks),
		foot: foot(donor.takenInAt)
	}));
}

async function binSigns(tx: Tx, ctx: Context, codes: string[], foot: string): Promise<Label[]> {
	const rows = await tx
		.select()
		.from(bin)
		.where(and(eq(bin.shopId, ctx.shopId), inArray(bin.tag, codes)));
	return rows.map(({ tag: code, address, purpose, place, red }) => ({
		...{ what: 'bin', code, address, purpose, place, caution: binCaution(red), foot }
	}));
}

/** The labels of these tags in their order; what is no tag of this shop is left out. */
export const labelsOf = (ctx: Context, codes: readonly string[]): Promise<Label[]> =>
	inShop(ctx, async (tx, ctx) => {
		if (codes.length === 0) return [];
		const { name, timeZone } = await getShop(ctx);
		const foot: Foot = (day) => `${date(day, timeZone)} · ${name}`;
		const tags = await tx
			.select({ code: tag.code, what: tag.what })
			.from(tag)
			.where(and(eq(tag.shopId, ctx.shopId), inArray(tag.code, [...codes])));
		const of = (what: string) => tags.filter((one) => one.what === what).map((one) => one.code);
		const made: Label[] = [
			...(await partLabels(tx, ctx, of('part'), foot)),
			...(await boxLabels(tx, ctx, of('box'), foot)),
			...(await binSigns(tx, ctx, of('bin'), name)),
			...of('blank').map((code): Label => ({ what: 'blank', code, foot: name }))
		];
		const byCode = new Map(made.map((label) => [label.code, label]));
		return codes.flatMap((code) => byCode.get(code) ?? []);
	});
