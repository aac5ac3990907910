export const SHORTEST_PASSWORD = 15;
export const LONGEST_PASSWORD = 128;

/** Whole passwords that everybody tries first; compared as a whole, ignoring case and spaces at the ends. */
const TRIED_FIRST = new Set([
	'passwordpassword',
	'password12345678',
	'123456789012345',
	'1234567890123456',
	'12345678901234567890',
	'111111111111111',
	'aaaaaaaaaaaaaaa',
	'qwertyuiopasdfgh',
	'qwertyuiopasdfghjkl',
	'abcdefghijklmno',
	'abcdefghijklmnop',
	'iloveyouiloveyou',
	'letmeinletmeinletmein',
	'correct horse battery staple',
	'correcthorsebatterystaple',
	'endplayendplayendplay',
	'administrator123',
	'changemechangeme',
	'lawnmowerlawnmower'
]);

/**
 * Why a password is refused, or null when it will do.
 * @param known words that belong to the person or shop (names, e-mail): none of them may be the whole password
 */
export function passwordFault(password: string, known: readonly string[]): string | null {
	const length = [...password].length;
	if (length < SHORTEST_PASSWORD)
		return `Make the password ${SHORTEST_PASSWORD} characters or longer: this one has ${length}. A short sentence works well.`;
	if (length > LONGEST_PASSWORD)
		return `Keep the password to ${LONGEST_PASSWORD} characters: this one has ${length}.`;
	const whole = password.trim().toLowerCase();
	if (TRIED_FIRST.has(whole) || /^(.)\1*$/u.test(whole))
		return 'Choose another password: this one is among the first that get tried.';
	if (known.some((word) => word.trim().toLowerCase() === whole))
		return 'Choose another password: this one is a name or address of yours or of the shop.';
	return null;
}
