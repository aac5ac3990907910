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
	const dark = new Set([...path.matchAll(/M(\d+) (\d+)h/g)].map(([, x, y]) => `${x},${y}`));
	const columns = [...dark].map((at) => Number(at.split(',')[0]));
	expect([Math.min(...columns), Math.max(...columns)]).toEqual([4, size - 5]);
	for (const [x, y] of [
		[4, 4],
		[size - 5, 4],
		[4, size - 5]
	])
		expect(dark.has(`${x},${y}`)).toBe(true);
});
