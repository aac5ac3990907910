export const ROLES = ['owner', 'counter', 'bench', 'reader'] as const;
export type Role = (typeof ROLES)[number];

/** What a member may be allowed to do, in the words of the shop floor. */
export type Ability = 'see' | 'see terms' | 'see costs' | 'work' | 'hold' | 'trade' | 'run';

/** Who may do what: the one table that routes, verbs and buttons read. */
const MAY: Record<Ability, readonly Role[]> = {
	/** Donors, parts, bins, asked prices, verdicts. */
	see: ['owner', 'counter', 'bench', 'reader'],
	/** The terms behind a verdict. */
	'see terms': ['owner', 'counter', 'bench'],
	/** What donors cost, the policy, the ledger. */
	'see costs': ['owner', 'counter'],
	/** Take in, strip, log, prove, move, photograph, scrap. */
	work: ['owner', 'counter', 'bench'],
	/** Hold, free, fit on a job. */
	hold: ['owner', 'counter', 'bench'],
	/** Prices, sell, take back, wants, offers. */
	trade: ['owner', 'counter'],
	/** Policy, people, keys, bins' costs, gates overruled, export, delete. */
	run: ['owner']
};

export function may(role: Role, ability: Ability): boolean {
	return MAY[ability].includes(role);
}

/** The words of the refusal when a role lacks an ability. */
export function whoMay(ability: Ability): string {
	const roles = MAY[ability];
	return roles.length === 1
		? `the ${roles[0]}`
		: `the ${roles.slice(0, -1).join(', the ')} or the ${roles.at(-1)}`;
}

export function isRole(word: string): word is Role {
	return (ROLES as readonly string[]).includes(word);
}
