import { describe, expect, it } from 'vitest';
import { passwordFault } from './password';

describe('a password', () => {
	it('of 14 characters is refused with the reason, of 15 and of 128 is taken', () => {
		expect(passwordFault('x1y2z3a4b5c6d7', [])).toContain('15 characters');
		expect(passwordFault('x1y2z3a4b5c6d7e', [])).toBeNull();
		expect(passwordFault('ab'.repeat(64), [])).toBeNull();
		expect(passwordFault('ab'.repeat(64) + 'c', [])).toContain('128');
	});
	it('may hold spaces and characters of any script, counted as people count them', () => {
		expect(passwordFault('ключ от старой лодки', [])).toBeNull();
		expect(passwordFault('🔧'.repeat(14), [])).toContain('has 14');
	});
	it('is refused when as a whole it is on the list or a name, not when it only holds one', () => {
		expect(passwordFault(' Correct Horse Battery Staple ', [])).toContain('first that get tried');
		expect(passwordFault('a correct horse battery staple', [])).toBeNull();
		expect(passwordFault('Osiergate Engine Bench', ['osiergate engine bench'])).toContain('name');
		expect(passwordFault('zzzzzzzzzzzzzzzz', [])).toContain('first that get tried');
	});
});
