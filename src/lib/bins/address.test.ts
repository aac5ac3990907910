import { describe, expect, it } from 'vitest';
import { rackPlace, readAddress, tidyAddress } from './address';

describe('a bin address', () => {
	it.each([
		['K3-1', { address: 'K3-1', rack: 'K', shelf: 3, slot: 1 }],
		['k3-1', { address: 'K3-1', rack: 'K', shelf: 3, slot: 1 }],
		[' K 3 1 ', { address: 'K3-1', rack: 'K', shelf: 3, slot: 1 }],
		['K-3-1', { address: 'K3-1', rack: 'K', shelf: 3, slot: 1 }],
		['MEZZ12-104', { address: 'MEZZ12-104', rack: 'MEZZ', shelf: 12, slot: 104 }]
	])('reads %s as rack, shelf and slot', (typed, read) => {
		expect(readAddress(typed)).toEqual(read);
	});

	it.each(['under the bench', 'OUT-2', 'K0-1', 'K3-0', '3-1', 'K3', 'K31'])(
		'keeps %s as free words',
		(typed) => {
			expect(rackPlace(typed)).toBeNull();
			expect(readAddress(typed)).toEqual({ address: tidyAddress(typed) });
		}
	);

	it('folds case and spaces, so that one bin has one spelling', () => {
		expect(tidyAddress('  under   the bench ')).toBe('UNDER THE BENCH');
	});
});
