import type { GivenFigures } from './choices-view';

/** One figure of a decision as the form asks for it. */
export interface ChoiceField {
	field: string;
	name: keyof GivenFigures;
	label: string;
	unit: 'money' | 'per cent';
}

export const CHOICE_FIELDS: readonly ChoiceField[] = [
	{
		field: 'chance',
		name: 'fixChance',
		label: 'Chance that the repair holds',
		unit: 'per cent'
	},
	{ field: 'parts', name: 'newPartsCents', label: 'New parts for the repair', unit: 'money' },
	{ field: 'labour', name: 'labourCents', label: 'Labour of the repair', unit: 'money' },
	{ field: 'running', name: 'fixedPriceCents', label: 'Price of it running', unit: 'money' },
	{ field: 'dead', name: 'wholePriceCents', label: 'Price of it dead', unit: 'money' }
];
