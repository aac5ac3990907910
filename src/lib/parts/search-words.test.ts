import { expect, it } from 'vitest';
import { engineLexemes } from '../donors/lexemes';
import { searchWords } from './search-words';

const part = {
	label: 'Ignition  COIL',
	numbers: ['TN-4471-O2'],
	note: 'spark 10 kV, hole 3/4 in',
	engine: 'Sollane FERN-9',
	set: 'two bolts'
};

it('holds words without their plural, numbers whole and in pieces, sizes in millimetres', () => {
	expect(searchWords(part).split(' ').sort()).toEqual(
		'TN447102 FERN9 S0LLANEFERN9 10KV ignition coil tn 4471 02 sollane fern 9 spark 10kv hole 19.1mm 2 bolt'
			.split(' ')
			.sort()
	);
});

it('finds teeth that were counted by the word alone too', () => {
	const words = searchWords({ ...part, note: 'pinion of 10 teeth' }).split(' ');
	expect(words).toEqual(expect.arrayContaining(['10tooth', 'tooth']));
});

it('of a donor holds the plate and the displacement', () => {
	const words = engineLexemes({
		...{ maker: 'Ondrake', model: 'HX 270V', typeCode: '0044', dateCode: '', serial: '19I4-77' },
		...{ displacementCc: 269.7, offMachine: 'tiller', shaft: 'vertical' }
	}).split(' ');
	for (const word of ['HX270V', 'hx', '270V', '0044', '191477', '270cc', 'tiller', 'vertical'])
		expect(words).toContain(word);
});
