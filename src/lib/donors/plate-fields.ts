/** What a donor keeps of its plate and its emission label. */
export const PLATE_FIELDS = [
	'maker',
	'model',
	'typeCode',
	'dateCode',
	'serial',
	'displacementCc',
	'emissionFamily'
] as const;
export type PlateField = (typeof PLATE_FIELDS)[number];
