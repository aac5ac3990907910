import { engineKey } from '$lib/codes/number';
import type { Plan } from '$lib/find/plan';
import { sql, type SQL } from 'drizzle-orm';

const list = (values: readonly string[]): SQL => sql`${sql.param([...values])}::text[]`;
const anyOf = (wanted: (SQL | null)[]): SQL =>
	sql.join(
		wanted.filter((one) => one !== null).map((one) => sql`(${one})`),
		sql` or `
	);

/** What the words name apart from words: donor, bin, kinds. Null when they name none of these. */
function named({ donorNumber, bin, kinds }: Plan): SQL | null {
	const all = [
		donorNumber === null ? null : sql`donor_number = ${donorNumber}`,
		bin === null ? null : sql`(upper(place) = ${bin} or starts_with(upper(place), ${`${bin}-`}))`,
		kinds.length === 0 ? null : sql`kind = any(${list(kinds)})`
	].filter((one) => one !== null);
	return all.length === 0 ? null : sql.join(all, sql` and `);
}

/** Among several kinds the one that fits the words best comes first. */
const byKind = ({ kinds }: Plan): SQL =>
	kinds.length > 1 ? sql`array_position(${list(kinds)}, kind)` : sql`0`;

/** A tag, a part number or a whole address: exact 0 and 1, the beginning of a number 2, a piece of it 3. */
function codes({ text, tag, numberKey }: Plan): SQL {
	const number = (fits: SQL) => sql`exists (select from unnest(number_keys) k where ${fits}) `;
	const place = sql`upper(place) = ${text.toUpperCase()}`;
	const tags = tag && sql`${tag} in (tag, bin_tag, box_tag)`;
	const tries: [number, SQL][] = [[0, tags ? sql`${tags} or ${place}` : place]];
	if (numberKey) {
		tries.push([1, sql`${numberKey} = any(number_keys)`]);
		tries.push([2, number(sql`starts_with(k, ${numberKey})`)]);
		tries.push([3, number(sql`position(${numberKey} in k) > 0`)]);
	}
	const tier = sql.join(
		tries.map(([rank, fits]) => sql`when ${fits} then ${sql.raw(String(rank))}`),
		sql` `
	);
	return sql`select id, case ${tier} end as tier, 0 as unlike from shelf
		where ${anyOf(tries.map(([, fits]) => fits))}`;
}

/** Everything that was named, and each word to the letter or as a piece of the engine's name. */
function literal(plan: Plan): SQL {
	const words = plan.words.map(
		(word) => sql`(position(${word} in search_text) > 0
			or ${engineKey(word) || ' '} <> ' ' and position(${engineKey(word) || ' '} in engine_key) > 0)`
	);
	const all = [named(plan), ...words].filter((one) => one !== null);
	const fits = all.length === 0 ? sql`${plan.text === ''}` : sql.join(all, sql` and `);
	return sql`select id, 4 as tier, ${byKind(plan)} as unlike from shelf where ${fits}`;
}

/** Words with typos forgiven; then what was named, with the words only for the order; then any of the words. */
function relaxed(plan: Plan): SQL[] {
	const { words } = plan;
	const about = named(plan);
	if (words.length === 0) return [];
	const typos = sql`select s.id, 5 as tier, round(100 - 100 * w.likeness)::int as unlike
		from find_words(${list(words)}) w join shelf s on s.id = w.part_id where ${about ?? sql`true`}`;
	const likeness = sql`(select avg(word_similarity(w, search_text)) from unnest(${list(words)}) w)`;
	const loose = about
		? sql`select id, 6 as tier, round(100 - 100 * ${likeness})::int as unlike from shelf where ${about}`
		: sql`select f.part_id as id, 7 as tier, round(100 * (${words.length} - sum(f.likeness)))::int as unlike
			from unnest(${list(words)}) w cross join lateral find_words(array[w]) f group by f.part_id`;
	return [typos, loose];
}

/** The parts that answer, each with how well: a looser reading counts only where the stricter found nothing. */
export function hitsOf(plan: Plan): SQL {
	const strict = plan.text === '' ? literal(plan) : sql`${codes(plan)} union all ${literal(plan)}`;
	const steps = [strict, ...relaxed(plan)];
	const tables = steps.map(
		(step, at) => sql`step${sql.raw(String(at))} as materialized (
			select id, tier, unlike from (${step}) found
			where ${
				at === 0
					? sql`true`
					: sql.join(
							steps
								.slice(0, at)
								.map((_, before) => sql`not exists (select from step${sql.raw(String(before))})`),
							sql` and `
						)
			}
		)`
	);
	const all = steps.map((_, at) => sql`select * from step${sql.raw(String(at))}`);
	return sql`${sql.join(tables, sql`, `)}, hits as materialized (
		select distinct on (id) id, tier, unlike from (${sql.join(all, sql` union all `)}) met
		order by id, tier, unlike
	)`;
}
