import { ReleaseInput } from '$lib/donors/input';
import { releaseWords } from '$lib/donors/release-words';
import { getDonor, releaseDonor } from '$lib/server/donors';
import { getShop, page } from '$lib/server/people';
import { actionWithPhotos } from '$lib/server/photos';
import { Refused } from '$lib/refusal';
import { z } from 'zod';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, { params }: PageServerLoadEvent) => {
	const { number, engine, serial, release } = await getDonor(ctx, params.donor);
	return {
		...{ number, engine, serial, release },
		words: releaseWords(engine, serial, (await getShop(ctx)).name),
		back: { href: `/${params.shop}/donors/${params.donor}`, label: params.donor },
		short: number
	};
});

const Signed = ReleaseInput.omit({ route: true, signedWords: true }).extend({
	agreed: z.string().optional(),
	file: z.unknown().optional()
});

export const actions = {
	default: actionWithPhotos(
		'work',
		Signed,
		'file',
		async (ctx, { agreed, file: _, ...typed }, kept, { params }: RequestEvent) => {
			if (!typed.fromName) throw new Refused('bad input', 'Enter who gives it.', 'fromName');
			if (!agreed && kept.length === 0)
				throw new Refused(
					'bad input',
					'Sign in the box, or tick that it was read and agreed to.',
					'agreed'
				);
			const { engine, serial } = await getDonor(ctx, params.donor);
			const signedWords = releaseWords(engine, serial, (await getShop(ctx)).name);
			const input = { ...typed, signedWords, route: 'signed' as const };
			await releaseDonor(ctx, params.donor, input, kept[0]);
			return { to: `/${params.shop}/donors/${params.donor}?done=Release signed` };
		}
	)
};
