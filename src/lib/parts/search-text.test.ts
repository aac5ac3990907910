import { expect, it } from 'vitest';
import { searchText } from './search-text';

const part = {
	kind: 'coil',
	label: 'Ignition  COIL',
	numbers: ['TN-4471-02'],
	note: 'spark 10 kV',
	engine: 'Sollane FERN-9',
	set: 'two bolts'
};

it('holds label, kind, numbers, donor, note and set in lower case', () => {
	const donor = { number: 12, maker: 'Ondrake', model: 'TARN-21L', typeCode: '0044' };
	expect(searchText(part, donor)).toBe(
		'ignition coil ignition coil / magneto module tn-4471-02 ondrake tarn-21l 0044 d12 spark 10 kv two bolts'
	);
});

it('of old stock holds the engine that it says itself', () => {
	expect(searchText(part, null)).toContain('sollane fern-9');
});
