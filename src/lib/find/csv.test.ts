import { expect, it } from 'vitest';
import { csvHead, csvRow } from './csv';
import type { FoundItem } from './view';

const item: FoundItem = {
	...{ id: 1, tag: '0A1B2', kind: 'coil', kindName: 'Ignition coil', label: '=HYPERLINK("x")' },
	...{ grade: 'usable', state: 'held', bin: 'K3-1', donor: 'D4', engine: 'Ondrake "TARN", 21' },
	...{ askedCents: 1400, copyCents: null, newCents: 4405, verdict: 'keep', gainCents: 900 },
	...{
		photo: null,
		setMissing: '',
		heldBy: 'Wenna',
		heldUntil: null,
		out: null,
		reason: null,
		group: null
	}
};

it('keeps commas and quotes inside a cell and runs nothing', () => {
	expect(csvRow(item)).toBe(
		`0A1B2,Ignition coil,"'=HYPERLINK(""x"")",usable,held,K3-1,D4,"Ondrake ""TARN"", 21",14.00,,44.05,keep,Wenna,\r\n`
	);
	expect(csvHead().split(',')).toHaveLength(csvRow({ ...item, engine: '' }).split(',').length);
});
