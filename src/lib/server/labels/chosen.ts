import { readTag } from '$lib/codes';
import { readQuestion } from '$lib/find/input';
import { MOST_LABELS, type LabelChoice } from '$lib/labels/choice';
import { Refused } from '$lib/refusal';
import { and, asc, eq, gte, isNull, notInArray, sql, type SQL } from 'drizzle-orm';
import { getBin } from '../bins';
import { bin } from '../bins/tables';
import { inShop, type Context } from '../context';
import { getDonor, todayIn } from '../donors';
import { box } from '../donors/tables';
import { findParts } from '../find';
import { part } from '../parts/tables';
import { getShop } from '../people';
import { listBlanks } from '../tags';

const here = notInArray(part.state, ['out', 'scrapped']);

const partTags = (ctx: Context, which: SQL | undefined): Promise<string[]> =>
	inShop(ctx, async (tx) => {
		const rows = await tx
			.select({ tag: part.tag })
			.from(part)
			.where(and(eq(part.shopId, ctx.shopId), here, which))
			.orderBy(asc(part.id))
			.limit(MOST_LABELS + 1);
		return rows.map((row) => row.tag);
	});

/** Parts logged and boxes tagged on the shop's own day. */
export const todayTags = (ctx: Context): Promise<string[]> =>
	inShop(ctx, async (tx, ctx) => {
		const day = await todayIn(ctx);
		const { timeZone } = await getShop(ctx);
		const began = sql`(${day}::date::timestamp at time zone ${timeZone})`;
		const boxes = await tx
			.select({ tag: box.tag })
			.from(box)
			.where(and(eq(box.shopId, ctx.shopId), gte(box.createdAt, began)))
			.orderBy(asc(box.id))
			.limit(MOST_LABELS + 1);
		return [...boxes.map((row) => row.tag), ...(await partTags(ctx, gte(part.pulledAt, began)))];
	});

const signs = (ctx: Context, rack: string): Promise<string[]> =>
	inShop(ctx, async (tx) => {
		const only = rack === 'all' ? undefined : eq(bin.rack, rack.toUpperCase());
		const rows = await tx
			.select({ tag: bin.tag })
			.from(bin)
			.where(and(eq(bin.shopId, ctx.shopId), isNull(bin.retiredAt), only))
			.orderBy(asc(bin.rack), asc(bin.shelf), asc(bin.slot), asc(bin.address))
			.limit(MOST_LABELS + 1);
		return rows.map((row) => row.tag);
	});

async function ofDonor(ctx: Context, ref: string): Promise<string[]> {
	const donor = await getDonor(ctx, ref);
	const parts = await partTags(ctx, eq(part.donorId, donor.id));
	return [...donor.boxes.map((one) => one.tag), ...parts];
}

async function found(ctx: Context, search: string): Promise<string[]> {
	const asked = { ...readQuestion(new URLSearchParams(search)), limit: 100 };
	const tags: string[] = [];
	let cursor: string | undefined;
	do {
		const page = await findParts(ctx, { ...asked, together: 'no', cursor });
		tags.push(...page.items.map((item) => item.tag));
		cursor = page.next ?? undefined;
	} while (cursor !== undefined && tags.length <= MOST_LABELS);
	return tags;
}

const blanks = (ctx: Context, which: string) =>
	listBlanks(ctx, which === 'unused' ? undefined : Number(which) || 0);

/** The tags that a choice names, each once. */
export async function chosenTags(ctx: Context, choice: LabelChoice): Promise<string[]> {
	const typed = choice.tag.flatMap((one) => {
		const reading = readTag(one);
		return 'tag' in reading ? [reading.tag] : [];
	});
	const tags = new Set([
		...typed,
		...(choice.today ? await todayTags(ctx) : []),
		...(choice.bin ? (await getBin(ctx, choice.bin)).contents.map((one) => one.tag) : []),
		...(choice.signs ? await signs(ctx, choice.signs) : []),
		...(choice.donor ? await ofDonor(ctx, choice.donor) : []),
		...(choice.blanks ? await blanks(ctx, choice.blanks) : []),
		...(choice.found === undefined ? [] : await found(ctx, choice.found))
	]);
	if (tags.size * choice.copies > MOST_LABELS)
		throw new Refused(
			'bad input',
			`That is more than ${MOST_LABELS} labels at once. Choose fewer, or fewer of each.`,
			'copies'
		);
	return [...tags];
}
