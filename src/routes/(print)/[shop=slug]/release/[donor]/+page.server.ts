import { releaseWords } from '$lib/donors/release-words';
import { getDonor } from '$lib/server/donors';
import { getShop, page } from '$lib/server/people';
import type { PageServerLoadEvent } from './$types';

export const load = page('work', async (ctx, { params }: PageServerLoadEvent) => {
	const { name, slug } = await getShop(ctx);
	const { number, engine, serial, typeCode, offMachine } = await getDonor(ctx, params.donor);
	return {
		...{ name, slug, number, engine, serial, typeCode, offMachine },
		words: releaseWords(engine, serial, name)
	};
});
