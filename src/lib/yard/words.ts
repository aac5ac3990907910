/** What is collected in cans and has to be taken away by somebody who may. */
export const WASTES = ['used oil', 'old fuel', 'coolant', 'other'] as const;
export type Waste = (typeof WASTES)[number];

export const WASTE_WAYS = ['in', 'out'] as const;
export type WasteWay = (typeof WASTE_WAYS)[number];

/** What has to be out of a carcass before anybody buys it. */
export const DRAINED = [
	{ id: 'oil', said: 'Oil drained' },
	{ id: 'fuel', said: 'Fuel drained, caps off' },
	{ id: 'battery', said: 'Battery out' },
	{ id: 'coolant', said: 'Coolant and hydraulic oil drained' },
	{ id: 'filter', said: 'Oil filter drained hot or pressed' }
] as const;
export const DRAINED_IDS = DRAINED.map(({ id }) => id);
export type Drained = (typeof DRAINED)[number]['id'];
