import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { engineSymbol, kindSymbol } from './drawing';

const sheet = readFileSync('static/drawings.svg', 'utf8');
const drawn = new Set([...sheet.matchAll(/<symbol id="([a-z-]+)"/g)].map((found) => found[1]));

it('finds the drawing of a kind, of its system, or the plain part', () => {
	expect(kindSymbol('carb-float')).toBe('carburetor');
	expect(kindSymbol('unheard-of', 'Exhaust')).toBe('muffler');
	expect(kindSymbol('unheard-of')).toBe('part');
});

it('leads to nothing that is not drawn', () => {
	const source = readFileSync('src/lib/ui/drawing.ts', 'utf8');
	const map = source.slice(source.indexOf('kindsOf'), source.indexOf('const systems'));
	const named = [...map.matchAll(/^\t([a-z]+): '/gm)].map((found) => found[1] ?? '');
	expect(named.length).toBeGreaterThan(30);
	for (const symbol of named) expect(drawn, symbol).toContain(symbol);
	for (const engineClass of ['WB', 'GP', 'R1', 'R2', 'SN', 'GE', 'SA', 'TR', 'PW'])
		expect(drawn, engineClass).toContain(engineSymbol(engineClass));
	expect(drawn).toContain('part');
});

it('tells the starter from the stator', () => {
	expect(kindSymbol('starter12')).not.toBe(kindSymbol('stator'));
});

it('stays a light sheet: every drawing under 700 characters', () => {
	for (const symbol of sheet.split('\n').filter((line) => line.startsWith('<symbol')))
		expect(symbol.length, symbol.slice(0, 30)).toBeLessThan(700);
});
