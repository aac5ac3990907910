import { describe, expect, it } from 'vitest';
import { may, ROLES, whoMay, type Ability } from './role';

const TABLE: Record<Ability, string> = {
	see: 'owner counter bench reader',
	'see terms': 'owner counter bench',
	'see costs': 'owner counter',
	work: 'owner counter bench',
	hold: 'owner counter bench',
	trade: 'owner counter',
	run: 'owner'
};

describe('who may do what', () => {
	it.each(Object.entries(TABLE))('%s: %s and nobody else', (ability, roles) => {
		expect(ROLES.filter((role) => may(role, ability as Ability)).join(' ')).toBe(roles);
	});
	it('is said in words', () => {
		expect(whoMay('run')).toBe('the owner');
		expect(whoMay('trade')).toBe('the owner or the counter');
		expect(whoMay('work')).toBe('the owner, the counter or the bench');
	});
});
