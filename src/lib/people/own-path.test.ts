import { describe, expect, it } from 'vitest';
import { ownPath } from './own-path';

describe('where a sign-in goes on to', () => {
	it('is a path on this site', () =>
		expect(ownPath('/osiergate/parts?q=coil')).toBe('/osiergate/parts?q=coil'));
	it.each([
		'//elsewhere.example',
		'/\\elsewhere.example',
		'https://elsewhere.example',
		null,
		'parts',
		''
	])('and never %s', (wanted) => expect(ownPath(wanted)).toBe('/'));
});
