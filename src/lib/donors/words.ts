export const DONOR_STATES = ['whole', 'on the bench', 'stripped', 'parked', 'gone'] as const;
export type DonorState = (typeof DONOR_STATES)[number];

/** How sure the cause of death is. */
export const SURENESS = ['seen', 'likely', 'told'] as const;
export type Sureness = (typeof SURENESS)[number];

export const SHAFTS = ['horizontal', 'vertical'] as const;
export type Shaft = (typeof SHAFTS)[number];

/** How the shop came to be allowed to take it apart. */
export const RELEASE_ROUTES = [
	'signed',
	'bought',
	'invoice',
	'insurer',
	'unclaimed',
	'given',
	'traded',
	'own'
] as const;
export type ReleaseRoute = (typeof RELEASE_ROUTES)[number];

export const ROUTE_SAID: Record<ReleaseRoute, string> = {
	signed: 'customer signed a release',
	bought: 'bought over the counter, identity noted',
	invoice: 'bought from a dealer, invoice kept',
	insurer: "insurer's letter",
	unclaimed: 'unclaimed, after the legal steps',
	given: 'given to the shop, in writing',
	traded: 'traded in',
	own: "the shop's own"
};

/** What a photo of a donor shows. */
export const DONOR_SHOTS = [
	'front',
	'back',
	'label',
	'pto',
	'carburetor side',
	'failure',
	'box',
	'part',
	'other'
] as const;
export type DonorShot = (typeof DONOR_SHOTS)[number];
