import { expect, it } from 'vitest';
import { drawQr, scanAddress } from './qr';

it('an address of up to 29 characters is a code of 25 modules and its quiet zone', () => {
	const address = scanAddress('http://shop.example', 'ab', 'k7m3x');
	expect(address).toBe('HTTP://SHOP.EXAMPLE/T/AB/K7M3X');
	expect(drawQr(address.slice(0, 29)).size).toBe(25 + 8);
	expect(drawQr(scanAddress('https://endplay.example', 'osiergate', 'K7M3X')).size).toBe(29 + 8);
});

it('the quiet zone is four modules wide and the three eyes are drawn', () => {
	const { size, path } = drawQr('HTTP://SHOP.EXAMPLE/T/AB/K7M3X');
	const runs = [...path.matchAll(/M(\d+) (\d+)h(\d+)v1/g)].map((run) => run.slice(1).map(Number));
	const starts = runs.map(([x]) => x!);
	const ends = runs.map(([x, , wide]) => x! + wide!);
	expect([Math.min(...starts), Math.max(...ends)]).toEqual([4, size - 4]);
	const eyes = [
		[4, 4],
		[size - 11, 4],
		[4, size - 11]
	];
	for (const [x, y] of eyes) expect(runs).toContainEqual([x, y, 7]);
});
