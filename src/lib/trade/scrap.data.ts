// Money for a kilogram of mixed loads; the shop puts its own yard's prices over these.
export const SCRAP_CLASSES = [
	{ id: 'Fe-L', said: 'light iron, sheet', lowCentsPerKg: 7, highCentsPerKg: 25 },
	{ id: 'Fe-H', said: 'heavy steel, cast iron', lowCentsPerKg: 16, highCentsPerKg: 44 },
	{ id: 'Al-Fe', said: 'irony aluminium (steel still in)', lowCentsPerKg: 15, highCentsPerKg: 55 },
	{ id: 'Al-C', said: 'clean cast aluminium', lowCentsPerKg: 70, highCentsPerKg: 110 },
	{ id: 'Zn', said: 'zinc die-cast', lowCentsPerKg: 40, highCentsPerKg: 90 },
	{ id: 'Cu-M', said: 'copper-bearing motors, coils', lowCentsPerKg: 22, highCentsPerKg: 93 },
	{ id: 'Brass', said: 'brass', lowCentsPerKg: 230, highCentsPerKg: 460 },
	{ id: 'Batt', said: 'lead battery', lowCentsPerKg: 37, highCentsPerKg: 49 },
	{ id: 'Plast', said: 'plastic', lowCentsPerKg: 0, highCentsPerKg: 0 },
	{ id: 'Rubber', said: 'rubber', lowCentsPerKg: 0, highCentsPerKg: 0 },
	{ id: 'Waste', said: 'waste', lowCentsPerKg: 0, highCentsPerKg: 0 }
] as const;
