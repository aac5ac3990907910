// Figures of made-up parts, the same in every run: whole cents and minutes, shares in hundredths.

/** What is the same for every part of the shop; common practice, no source. */
export const POLICY = {
	copyCap: 0.8,
	steps: [{ underCents: 5000, stepCents: 100 }, { stepCents: 500 }],
	leastCents: 1000,
	marginCents: 500,
	moneyRate: Math.log(1.1),
	labourNow: 2000 / 60,
	labour: 3400 / 60
};

export const COLUMNS = [
	...['new_cents', 'copy_cents', 'share', 'chance', 'come_back', 'refit_cents', 'kit_cents'],
	...['calls', 'place', 'dying', 'shelf_cents', 'scrap_cents', 'later', 'waiting']
];

/**
 * @typedef {Record<'new_cents' | 'copy_cents' | 'share' | 'chance' | 'come_back' | 'refit_cents' |
 * 	'kit_cents' | 'calls' | 'place' | 'dying' | 'shelf_cents' | 'scrap_cents' | 'later' | 'waiting',
 * 	number>} Figures
 */

/** @param {Float64Array[]} columns @param {number} row */
export const figuresAt = (columns, row) =>
	/** @type {Figures} */ (
		Object.fromEntries(COLUMNS.map((name, at) => [name, columns[at]?.[row] ?? 0]))
	);

/** @param {number} rows @returns {Float64Array[]} in the order of COLUMNS; no copy is 0 */
export function drawColumns(rows) {
	let seed = 20_261_201;
	const draw = (/** @type {number} */ most) => (seed = (seed * 48_271) % 2_147_483_647) % most;
	const pick = (/** @type {number[]} */ list) => list[draw(list.length)] ?? 0;
	const drawers = [
		() => 800 + draw(30_000),
		() => (draw(3) ? 0 : 500 + draw(9000)),
		() => pick([0.6, 0.45, 0.3, 0.25, 0.1]),
		() => (2 + draw(97)) / 100,
		() => pick([0.02, 0.04, 0.06, 0.08, 0.12]),
		() => pick([567, 1133, 1700, 3400]),
		() => pick([0, 0, 0, 300, 800, 1200]),
		() => (5 + draw(400)) / 100,
		() => 1 + draw(6),
		() => pick([0.1625, 0.3567]),
		() => pick([20, 80, 250, 800]),
		() => draw(400),
		() => draw(40),
		() => pick([0, 0, 0, 0, 0.7])
	];
	const columns = drawers.map(() => new Float64Array(rows));
	for (let row = 0; row < rows; row++)
		columns.forEach((column, at) => (column[row] = drawers[at]?.() ?? 0));
	return columns;
}
