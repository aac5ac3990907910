import { storeAnswers } from '$lib/server/storage';
import { sql } from 'drizzle-orm';

const LONGEST_MS = 3000;

const late = () =>
	new Promise((_, no) => setTimeout(() => no(new Error('late')), LONGEST_MS).unref());

const answers = (work: Promise<unknown>) =>
	Promise.race([work, late()]).then(
		() => 'ok',
		() => 'no answer'
	);

/** Open to everybody: what the product stands on answers, or which part does not. */
export const GET = async ({ locals }) => {
	const [database, store] = await Promise.all([
		answers(locals.db.execute(sql`select 1`)),
		answers(storeAnswers())
	]);
	const ready = database === 'ok' && store === 'ok';
	return Response.json({ database, store }, { status: ready ? 200 : 503 });
};
