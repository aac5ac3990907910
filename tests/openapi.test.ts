import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { openApi, rows } from '../src/routes/api/openapi.json/document';

const API = 'src/routes/api/[shop=slug]';

/** Every method of every route of a shop, as the description spells them. */
const routes = readdirSync(API, { recursive: true, encoding: 'utf8' })
	.filter((file) => file.endsWith('+server.ts'))
	.flatMap((file) => {
		const source = readFileSync(`${API}/${file}`, 'utf8');
		const path = `/${file.replace(/\/?\+server\.ts$/, '')}`.replace(/\[(\w+)(=\w+)?\]/g, '{$1}');
		return [
			...source.matchAll(/^export const (GET|POST|PUT|PATCH|DELETE)\b[^'"]*'([a-z ]+)'/gm)
		].map((found) => ({ call: `${found[1]!.toLowerCase()} ${path}`, may: found[2]! }));
	});

describe('the description of the outside edge', () => {
	it('has a row for every method of every route, with who may, and no row too many', () => {
		const described = rows.map((row) => `${row.method} ${row.path}: ${row.may}`);
		expect(described.sort()).toEqual(routes.map(({ call, may }) => `${call}: ${may}`).sort());
		expect(new Set(described).size).toBe(described.length);
	});

	it('is kept in api/openapi.json; npm run openapi writes it anew', () => {
		const kept = JSON.parse(readFileSync('api/openapi.json', 'utf8'));
		expect(kept).toEqual(JSON.parse(JSON.stringify(openApi())));
	});

	it('describes bodies by the inputs of the server', () => {
		const { paths, openapi } = openApi();
		expect(openapi).toBe('3.1.0');
		const take = paths?.['/api/{shop}/donors']?.post;
		const body = JSON.stringify(take?.requestBody);
		for (const field of ['maker', 'model', 'serial', 'cause', 'holdUntil'])
			expect(body).toContain(`"${field}"`);
		expect(JSON.stringify(take?.parameters)).toContain('Idempotency-Key');
		expect(Object.keys(take?.responses ?? {})).toEqual(
			expect.arrayContaining(['201', '400', '401', '403', '404', '422'])
		);
		const find = JSON.stringify(paths?.['/api/{shop}/parts']?.get?.parameters);
		for (const name of ['q', 'kind', 'grade', 'bin', 'state', 'donor', 'limit', 'cursor'])
			expect(find).toContain(`"name":"${name}"`);
	});
});
