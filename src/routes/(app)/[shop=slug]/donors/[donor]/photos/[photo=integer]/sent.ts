import type { SubmitFunction } from '@sveltejs/kit';

/** A form that keeps what was typed when it is refused, and goes on when it was done. */
export const sentTo =
	(done: () => void): SubmitFunction =>
	() =>
	async ({ result, update }) => {
		await update({ reset: false });
		if (result.type === 'redirect') done();
	};
