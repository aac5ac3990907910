import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

const ROUTES = 'src/routes';
/** Doors outside any shop: each says in a comment above its export who may come. */
const OUTSIDE = ['(public)', '(auth)', 'theme', 'livez', 'readyz', 't/', 'api/openapi.json'];
const SAYS_WHO = /\/\*\*[^/]*(open to|for whoever)/i;
const KEEPERS =
	/^(page|action|read|change|changeWithPhoto|actionWithPhotos|visitorAction)(<\w+>)?\(\s*'(see|see terms|see costs|work|hold|trade|run)'/;

const serverFiles = readdirSync(ROUTES, { recursive: true, encoding: 'utf8' })
	.filter((file) => /\+(page|layout)?\.?server\.ts$/.test(file))
	.map((file) => ({ file, source: readFileSync(join(ROUTES, file), 'utf8') }));

const outside = (file: string) => OUTSIDE.some((place) => file.startsWith(place));

/** What a door exports: load, an HTTP verb, or the actions by name. */
function doors(source: string): { name: string; opens: string }[] {
	const exported = [...source.matchAll(/export const (load|GET|POST|PUT|PATCH|DELETE)\b[^=]*= ?/g)];
	const found = exported.map((one) => ({
		name: one[1]!,
		opens: source.slice(one.index + one[0].length)
	}));
	const actions = source.indexOf('export const actions');
	if (actions < 0) return found;
	const block = source.slice(actions);
	const named = [...block.matchAll(/^(?:\t|export const actions = \{ )([\w'-]+): /gm)];
	return [
		...found,
		...named.map((one) => ({ name: one[1]!, opens: block.slice(one.index + one[0].length) }))
	];
}

describe('every door', () => {
	it('is found', () => expect(serverFiles.length).toBeGreaterThan(15));

	it.each(serverFiles.filter(({ file }) => !outside(file)))(
		'of $file states who may pass',
		({ source }) => {
			const found = doors(source);
			expect(found.length).toBeGreaterThan(0);
			for (const door of found) expect(door.opens, door.name).toMatch(KEEPERS);
		}
	);

	it.each(serverFiles.filter(({ file }) => outside(file)))(
		'of $file says who may come',
		({ source }) => {
			expect(source).toMatch(SAYS_WHO);
		}
	);
});
