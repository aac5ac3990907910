import { describe, expect, it } from 'vitest';
import { LimitsForm, ownLimits } from './limits-input';

const typed = { version: '2', kind: 'eclutch' };

describe('the limits of a test', () => {
	it('are those that were typed; what is left empty stays usual', () => {
		const form = LimitsForm.parse({ ...typed, 'most-coil': '4,5', 'least-gap': '' });
		expect(form).toMatchObject({ kind: 'eclutch', version: 2 });
		expect(ownLimits(form.limits)).toEqual({ coil: { most: 4.5 } });
	});
	it.each([
		[{ 'most-coil': 'a lot' }, 'limits.coil.most', 'Enter each limit as a number'],
		[{ 'least-coil': '5', 'most-coil': '2' }, 'limits.coil.least', 'not above the most']
	])('%o is refused in words', (fields, path, words) => {
		const issue = LimitsForm.safeParse({ ...typed, ...fields }).error?.issues[0];
		expect(issue?.path.join('.')).toBe(path);
		expect(issue?.message).toContain(words);
	});
	it('are of a kind that there is', () => {
		expect(LimitsForm.safeParse({ version: '0', kind: 'soup' }).success).toBe(false);
	});
});
