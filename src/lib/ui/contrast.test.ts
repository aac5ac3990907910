import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const css = readFileSync('src/app.css', 'utf8');

function tokens(selector: string): Record<string, string> {
	const start = css.indexOf(`${selector} {`);
	if (start < 0) throw new Error(`${selector} is not in app.css`);
	const block = css.slice(start, css.indexOf('}', start));
	return Object.fromEntries(
		[...block.matchAll(/--([a-z-]+): (#[0-9a-f]{6});/g)].map((found) => [found[1], found[2]])
	);
}

function luminance(colour: string): number {
	const [r, g, b] = [1, 3, 5].map((at) => {
		const part = parseInt(colour.slice(at, at + 2), 16) / 255;
		return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
	}) as [number, number, number];
	return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(one: string, other: string): number {
	const [low, high] = [luminance(one), luminance(other)].sort((a, b) => a - b) as [number, number];
	return (high + 0.05) / (low + 0.05);
}

const device = ":root:not([data-theme='light'], [data-theme='sunlight'])";
const themes = {
	light: tokens('\n:root'),
	dark: tokens(":root[data-theme='dark']"),
	'dark by the device': tokens(device),
	sunlight: tokens(":root[data-theme='sunlight']")
};
const grounds = ['paper', 'tag', 'tag-deep', 'white'];
const words = ['ink', 'slate', 'verdigris', 'brass', 'oxide', 'kraft-deep'];

it('knows black on white', () => {
	expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5);
	expect(contrast('#777777', '#ffffff')).toBeCloseTo(4.48, 2);
});

describe.each(Object.entries(themes))('%s', (_, theme) => {
	const pick = (name: string) => {
		const colour = theme[name];
		if (!colour) throw new Error(`no --${name}`);
		return colour;
	};
	it.each(words)('%s reads at 7:1 on every ground', (word) => {
		for (const ground of grounds)
			expect(contrast(pick(word), pick(ground)), ground).toBeGreaterThanOrEqual(7);
	});
	it('marks and edges of controls stand out at 3:1', () => {
		for (const mark of ['kraft', 'ink', 'slate', 'oxide'])
			for (const ground of grounds)
				expect(contrast(pick(mark), pick(ground)), `${mark}/${ground}`).toBeGreaterThanOrEqual(3);
	});
	it('words on ink, oxide and kraft deep are in paper and read at 7:1', () => {
		for (const ground of ['ink', 'oxide', 'kraft-deep', 'slate'])
			expect(contrast(pick('paper'), pick(ground)), ground).toBeGreaterThanOrEqual(7);
	});
});

it('shows the same dark face whether chosen or taken from the device', () => {
	expect(themes['dark by the device']).toEqual(themes.dark);
	expect(Object.keys(themes.dark).length).toBe(Object.keys(themes.light).length);
});
