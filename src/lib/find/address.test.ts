import { describe, expect, it } from 'vitest';
import { moreOf, searchOf } from './address';

describe('the address of a search', () => {
	it('carries what is asked and nothing else', () => {
		expect(searchOf({})).toBe('');
		expect(searchOf({ q: ' carb & co ', grade: '', limit: 25 })).toBe('q=carb+%26+co');
		expect(searchOf({ q: 'carb', limit: 50, cursor: '1' }, {})).toBe('q=carb');
	});

	it('starts at the first page when anything is changed', () => {
		const asked = { q: 'carb', limit: 100, cursor: '1.4.0.2.3' };
		expect(searchOf(asked, { grade: 'usable' })).toBe('q=carb&grade=usable');
		expect(searchOf(asked, { q: '' })).toBe('');
	});

	it('shows more by a longer list, then by the following page', () => {
		expect(moreOf({ q: 'carb' }, null)).toBeNull();
		expect(moreOf({ q: 'carb' }, '1.4.0.2.3')).toBe('q=carb&limit=50');
		expect(moreOf({ limit: 75 }, '1.4.0.2.3')).toBe('limit=100');
		expect(moreOf({ limit: 100 }, '1.4.0.2.3')).toBe('limit=100&cursor=1.4.0.2.3');
		expect(moreOf({ cursor: '1.4.0.2.3' }, '1.4.0.9.9')).toBe('cursor=1.4.0.9.9');
	});
});
