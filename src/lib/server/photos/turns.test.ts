import fc from 'fast-check';
import { expect, it } from 'vitest';
import { room } from './turns';

it('what is inside never weighs more than the total, and everything gets in', async () => {
	await fc.assert(
		fc.asyncProperty(
			fc.array(fc.integer({ min: 0, max: 30 }), { maxLength: 30 }),
			async (weights) => {
				const enter = room(20);
				let [inside, done] = [0, 0];
				await Promise.all(
					weights.map((weight) =>
						enter(weight, async () => {
							inside += weight;
							expect(inside <= 20 || inside === weight).toBe(true);
							await Promise.resolve();
							inside -= weight;
							done += 1;
						})
					)
				);
				expect(done).toBe(weights.length);
			}
		)
	);
});

it('a light one does not wait behind a heavy one', async () => {
	const enter = room(10);
	const order: string[] = [];
	let free = () => {};
	const first = enter(6, () => new Promise<void>((go) => (free = go)));
	const heavy = enter(9, async () => void order.push('heavy'));
	const light = enter(2, async () => void order.push('light'));
	await light;
	expect(order).toEqual(['light']);
	free();
	await Promise.all([first, heavy]);
	expect(order).toEqual(['light', 'heavy']);
});
