import { whoMay } from '$lib/people/role';
import {
	OpenAPIRegistry,
	OpenApiGeneratorV31,
	type RouteConfig
} from '@asteasolutions/zod-to-openapi';
import { Fault } from './answers';
import { bench } from './bench';
import { donorWorth } from './donor-worth';
import { donors } from './donors';
import { parts } from './parts';
import { z, type Row } from './row';
import { shelf } from './shelf';
import { wants } from './wants';
import { walks } from './walks';
import { worth } from './worth';
import { yard } from './yard';

export const rows: readonly Row[] = [...donors, ...bench, ...donorWorth, ...parts, ...shelf, ...walks, ...wants, ...worth,
	...yard];

const PARAMS: Record<string, string> = {
	shop: 'Slug of the shop',
	donor: 'Number of the donor, D12, or the tag of one of its boxes',
	part: 'Tag of the part',
	bin: 'Address of the bin, or its tag',
	walk: 'Number of the walk',
	want: 'Number of the want, W12',
	customer: 'Id of the customer',
	tag: 'Any tag, as typed',
	id: 'Id of the photo',
	run: 'Number of the scrap run',
	size: 'thumb, card or full',
	call:
		'usedPrice, gain, keepCleaning, pullPlan, decide, allocate, carry, learnChance, learnRate or learnShare'
};

const idempotency = z.object({
	'Idempotency-Key': z
		.string()
		.max(200)
		.describe('A key of yours for this change: sent again it is answered, not done, again')
});

const REFUSALS: Record<number, string> = {
	400: 'Something in what was sent is to be put right',
	401: 'Not signed in, and no key of this shop',
	403: 'Not for this role',
	404: 'Not there, or not of this shop',
	409: 'Taken, changed meanwhile, or a gate is shut: says by whom, since when, what opens it',
	422: 'This key was sent before with another body'
};

const isChange = (row: Row) => row.method !== 'get' && !row.changesNothing;

function params(path: string): z.ZodObject {
	const names = [...path.matchAll(/\{(\w+)\}/g)].map((found) => found[1]!);
	return z.object(
		Object.fromEntries(names.map((name) => [name, z.string().describe(PARAMS[name] ?? name)]))
	);
}

function sent({ body, form }: Row) {
	if (body) return { required: true, content: { 'application/json': { schema: body } } };
	if (!form) return undefined;
	const file = z.string().openapi({ format: 'binary', description: 'JPEG, PNG, WebP, AVIF or HEIC' });
	return { required: true, content: { 'multipart/form-data': { schema: form.extend({ file }) } } };
}

function contentOf(gives: Row['gives']): Record<string, { schema: z.ZodType }> {
	if (gives === 'picture')
		return { 'image/webp': { schema: z.string().openapi({ format: 'binary' }) } };
	if (gives === 'stream') return { 'text/event-stream': { schema: z.string() } };
	return { 'application/json': { schema: gives } };
}

function answers(row: Row): RouteConfig['responses'] {
	const content = contentOf(row.gives);
	const refused = [400, 401, 403, 404, ...(row.shut ? [409] : []), ...(isChange(row) ? [422] : [])];
	const faults = refused.map((status) => [
		status,
		{ description: REFUSALS[status]!, content: { 'application/json': { schema: Fault } } }
	]);
	return { [row.status ?? 200]: { description: 'Done', content }, ...Object.fromEntries(faults) };
}

function described(row: Row): RouteConfig {
	const path = `/api/{shop}${row.path}`;
	const body = sent(row);
	return {
		method: row.method,
		path,
		summary: row.said,
		description: `For ${whoMay(row.may)}.`,
		security: [{ key: [] }, { session: [] }],
		request: {
			params: params(path),
			...(row.query ? { query: row.query } : {}),
			...(isChange(row) ? { headers: idempotency } : {}),
			...(body ? { body } : {})
		},
		responses: answers(row)
	};
}

/** The outside edge as OpenAPI 3.1, from the inputs that the server itself reads by. */
export function openApi() {
	const registry = new OpenAPIRegistry();
	registry.registerComponent('securitySchemes', 'key', { type: 'http', scheme: 'bearer' });
	const session = { type: 'apiKey', in: 'cookie', name: 'endplay.session' } as const;
	registry.registerComponent('securitySchemes', 'session', session);
	for (const row of rows) registry.registerPath(described(row));
	return new OpenApiGeneratorV31(registry.definitions).generateDocument({
		openapi: '3.1.0',
		info: {
			title: 'Endplay',
			version: '1',
			description: 'The shelf of a repair shop. Amounts are whole cents, dates ISO 8601.'
		}
	});
}
