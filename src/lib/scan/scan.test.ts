import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { makeTag } from '../codes';
import { scanAddress } from '../tags/qr';
import { cameraSaid } from './camera';
import { aimedAt } from './central';
import { onceSeen, OUT_OF_SIGHT } from './once-seen';
import { readScan, sayScan } from './read';

const tags = fc
	.infiniteStream(fc.integer({ min: 0, max: 2 ** 32 - 1 }))
	.map((drawn) => makeTag(() => drawn.next().value as number));

describe('what a camera reads', () => {
	it('is the tag of any label of the shop, on whatever host it was printed', () => {
		const hosts = fc.constantFrom('http://localhost:3000', 'https://endplay.example');
		fc.assert(
			fc.property(tags, hosts, (tag, host) => {
				const address = scanAddress(host, 'osiergate', tag);
				for (const read of [address, address.toLowerCase(), tag, ` ${tag.toLowerCase()} `])
					expect(readScan(read, 'osiergate')).toEqual({ tag });
				expect(readScan(address, 'thrennick')).toEqual({ elsewhere: true });
			})
		);
	});

	it('is said in words when it is no tag', () => {
		const said = (text: string) => sayScan(readScan(text, 'ours'));
		expect(said('')).toBe('Type the five characters of the tag.');
		expect(said('https://shop.example/menu')).toMatch(/is no tag\. Tags have five characters/);
		expect(said('HTTPS://X.EXAMPLE/T/THEIRS/K7M3X')).toBe('This is the tag of another shop.');
	});

	it('offers the tag with two neighbours swapped back', () => {
		const offers = fc.sample(tags, 200).flatMap((tag) => {
			const scan = readScan(tag[1]! + tag[0]! + tag.slice(2), 'ours');
			return 'suggestion' in scan ? [{ tag, scan }] : [];
		});
		expect(offers.length).toBeGreaterThan(50);
		for (const { tag, scan } of offers) expect(sayScan(scan)).toContain(`Is it ${tag}?`);
	});
});

describe('a code before the camera', () => {
	it('counts once while it stays in sight, and again when it was away', () => {
		const isNew = onceSeen();
		const steps = Array.from({ length: 50 }, (_, at) => isNew('A', at * 100));
		expect(steps.filter(Boolean)).toHaveLength(1);
		expect(isNew('B', 5000)).toBe(true);
		expect(isNew('A', 5000 + OUT_OF_SIGHT)).toBe(true);
		expect(isNew('A', 5100 + OUT_OF_SIGHT)).toBe(false);
	});

	it('is the one aimed at, when there are several', () => {
		const [near, far] = [
			{ text: 'near', x: 0.6, y: 0.45 },
			{ text: 'far', x: 0.1, y: 0.5 }
		];
		expect(aimedAt([far, near])).toBe(near);
		expect(aimedAt([])).toBeNull();
	});
});

it('a camera that does not open is said with what to do', () => {
	const named = (name: string) => Object.assign(new Error(), { name });
	expect(cameraSaid(named('NotAllowedError'))).toContain('Allow it');
	expect(cameraSaid(named('NotFoundError'))).toContain('no camera');
	expect(cameraSaid(named('NotReadableError'))).toContain('Another program');
	expect(cameraSaid(named('Insecure'))).toContain('https');
	expect(cameraSaid('?')).toContain('Type the code');
});
