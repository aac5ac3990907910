/** What the law of one country says of what is left over; every place has its own. */
export interface Disposal {
	said: string;
	/** Where it is written, in the United States. */
	written: string;
}

export const DISPOSAL: readonly Disposal[] = [
	{
		said: 'Used oil: into a sound can that does not leak, marked “Used Oil”. Never with fuel, solvent or coolant. Stop, contain and clean up what is spilt.',
		written: '40 CFR 279.22'
	},
	{
		said: 'Taking used oil away yourself: at most 55 gallons at a time, in your own vehicle, to a place that may take it. Otherwise a hauler that may.',
		written: '40 CFR 279.24'
	},
	{
		said: 'Fuel in the shop outside a cabinet: at most 25 gallons of the most flammable kind for each fire area. Old fuel goes to the hazardous-waste depot.',
		written: '29 CFR 1910.106(e)(2)(ii)(b)'
	},
	{
		said: 'Batteries: never into the scrap bin. Upright, posts taped, back to a seller or a recycler.',
		written: '40 CFR 266.80 or 273'
	}
];

export const LOCAL_CODE =
	'These are sections of the United States. Your state, county or fire code governs, and a qualified person decides.';
