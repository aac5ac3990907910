import fc from 'fast-check';
import { FindQuery } from '$lib/find/input';
import { proofRange, STANDS } from '$lib/find/filters';
import { engineKey, numberKey } from '$lib/codes/number';
import { GRADES, PROOFS } from '$lib/parts/words';
import { eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { addBin } from '../bins';
import { inShop } from '../context';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { editDonor, parkDonor, takeIn } from '../donors';
import { donor } from '../donors/tables';
import {
	editPart,
	gradePart,
	holdPart,
	logOldStock,
	movePart,
	partsByIds,
	provePart,
	pullPart,
	sellPart
} from '../parts';
import { part, proof } from '../parts/tables';
import { putPrice, replaceNumber } from '../prices';
import { supersession } from '../prices/tables';
import { findParts } from './index';

const KINDS = ['coil', 'carb-float', 'recoil'];
const MODELS = ['HX-270V', 'QB 500', 'TARN-21L'];
const NUMBERS = ['TN-4471', 'TN-4472', '88-001', '88-002'];
const BINS = ['K3-1', 'K3-2', 'L1-1'];

type Step = { what: number; a: number; b: number; c: number };
const step = fc.record({ what: fc.nat(9), a: fc.nat(99), b: fc.nat(99), c: fc.nat(99) });
const pick = <T>(list: readonly T[], at: number): T => list[at % list.length]!;

interface World {
	shop: TestShop;
	donors: string[];
	tags: string[];
}

/** One thing that somebody does in a shop; what its rules refuse is refused and changes nothing. */
async function act({ shop: { ctx }, donors, tags }: World, { what, a, b, c }: Step): Promise<void> {
	const grade = pick(GRADES, b);
	const tag = tags.length > 0 ? pick(tags, a) : '';
	if (tag === '' && ![0, 1, 5, 6, 7].includes(what)) return;
	const version = tag === '' ? 1 : await versionOf(ctx, tag);
	const doing: (() => Promise<unknown>)[] = [
		async () =>
			tags.push(
				(
					await pullPart(ctx, pick(donors, a), {
						kind: pick(KINDS, b),
						grade,
						numbers: [pick(NUMBERS, c)],
						bin: pick(BINS, a)
					})
				).tag
			),
		async () =>
			tags.push(
				(
					await logOldStock(ctx, {
						kind: pick(KINDS, a),
						grade,
						engine: `Ondrake ${pick(MODELS, c)}`,
						bin: pick(BINS, b)
					})
				).tag
			),
		() => movePart(ctx, tag, { bin: pick(BINS, b) }),
		() => gradePart(ctx, tag, { grade, version }),
		() =>
			editPart(ctx, tag, {
				version,
				numbers: [pick(NUMBERS, b)],
				note: pick(['rope frayed', '42 mm holes', ''], c)
			}),
		() =>
			putPrice(ctx, {
				kind: pick(KINDS, a),
				engine: `Ondrake ${pick(MODELS, b)}`,
				newCents: 900 + c * 97,
				copyCents: c % 2 ? 700 + c * 31 : undefined,
				source: 'list',
				seenOn: '2026-03-01'
			}),
		() =>
			putPrice(ctx, {
				kind: pick(KINDS, a),
				number: pick(NUMBERS, b),
				newCents: 1500 + c * 113,
				source: 'list',
				seenOn: '2026-03-02'
			}),
		() =>
			editDonor(ctx, pick(donors, a), {
				maker: 'Ondrake',
				model: pick(MODELS, b),
				cause: pick(['worn', 'thrown-rod', 'stale-fuel'] as const, c),
				sureness: 'seen'
			}),
		() => provePart(ctx, tag, { how: pick(PROOFS, b), passed: c % 4 > 0 }),
		() =>
			c % 3 === 0
				? sellPart(ctx, tag, { cents: 900 })
				: c % 3 === 1
					? holdPart(ctx, tag, { for: 'Wenna' })
					: replaceNumber(ctx, {
							number: pick(NUMBERS, a),
							by: pick(NUMBERS, a + 1 + (b % 3)),
							ways: b % 2 ? 'one' : 'both',
							note: ''
						})
	];
	await doing[what]!().catch((fault: { code?: string }) => {
		if (typeof fault.code !== 'string' || 'query' in fault) throw fault;
	});
}

const versionOf = (ctx: TestShop['ctx'], tag: string) =>
	inShop(
		ctx,
		async (tx) =>
			(await tx.select({ version: part.version }).from(part).where(eq(part.tag, tag)))[0]!.version
	);

/** Every part of the shop with what decides whether it answers, read the slow way. */
const everything = ({ ctx }: TestShop) =>
	inShop(ctx, async (tx, ctx) => {
		const rows = await tx.select().from(part).where(eq(part.shopId, ctx.shopId));
		const items = await partsByIds(
			ctx,
			rows.map(({ id }) => id)
		);
		const donors = await tx.select().from(donor).where(eq(donor.shopId, ctx.shopId));
		const proofs = await tx.select().from(proof).where(eq(proof.shopId, ctx.shopId));
		const chains = await tx.select().from(supersession).where(eq(supersession.shopId, ctx.shopId));
		const parts = rows.map((row) => {
			const from = donors.find(({ id }) => id === row.donorId);
			const own = proofs.filter(({ partId }) => partId === row.id).sort((a, b) => a.id - b.id);
			const failedAt = own.findLastIndex(({ passed }) => !passed);
			const after = own.slice(failedAt + 1);
			const failed = failedAt >= 0 && !after.some(({ how }) => how.startsWith('bench test'));
			const item = items.find(({ id }) => id === row.id)!;
			return {
				row,
				item,
				engine: engineKey(from ? `${from.maker} ${from.model}` : row.engine),
				model: (from ? from.model : row.engine).toLowerCase(),
				proved: failed ? 0 : Math.max(0, ...after.map(({ how }) => PROOFS.indexOf(how) + 1))
			};
		});
		return { parts, chains };
	});

type Scan = Awaited<ReturnType<typeof everything>>;
type Seen = Scan['parts'][number];

const isHere = ({ row }: Seen) => row.state !== 'out' && row.state !== 'scrapped';

/** The numbers that serve for one, its chain followed; the old for the new only both ways. */
function serving({ chains }: Scan, number: string): Set<string> {
	const keys = new Set([numberKey(number)]);
	for (let before = 0; before < keys.size;) {
		before = keys.size;
		for (const { oldKey, newKey, bothWays } of chains) {
			if (keys.has(oldKey)) keys.add(newKey);
			if (bothWays && keys.has(newKey)) keys.add(oldKey);
		}
	}
	return keys;
}

async function compare(
	shop: TestShop,
	name: string,
	asked: object,
	scan: Scan,
	fits: (seen: Seen) => boolean
): Promise<void> {
	const found = await findParts(shop.ctx, FindQuery.parse({ limit: 100, ...asked }));
	const right = scan.parts.filter(fits);
	expect(found.items.map(({ id }) => id).sort(), name).toEqual(
		right.map(({ row }) => row.id).sort()
	);
	expect(found.total, name).toBe(right.length);
	for (const item of found.items) {
		const { item: slow } = scan.parts.find(({ row }) => row.id === item.id)!;
		expect(item, name).toMatchObject(slow);
		const alike = right.filter(
			({ row, engine }) =>
				row.kind === item.kind &&
				row.grade === item.grade &&
				row.state === item.state &&
				engine === engineOf(scan, item.id) &&
				`${row.numberKeys}` === numbersOf(scan, item.id)
		);
		const alone = engineOf(scan, item.id) === '' && numbersOf(scan, item.id) === '';
		expect(item.group?.count ?? 1, name).toBe(alone ? 1 : alike.length);
	}
}

const engineOf = ({ parts }: Scan, id: number) => parts.find(({ row }) => row.id === id)!.engine;
const numbersOf = ({ parts }: Scan, id: number) =>
	`${parts.find(({ row }) => row.id === id)!.row.numberKeys}`;

describe('the index under changes', () => {
	it('answers as a slow scan does, after whatever was done', async () => {
		await fc.assert(
			fc.asyncProperty(
				fc.array(step, { minLength: 20, maxLength: 50 }),
				fc.nat(99),
				async (steps, at) => {
					const { ours: shop } = await testShops();
					const { ctx } = shop;
					for (const address of BINS)
						await addBin(ctx, { address, size: 'm', purpose: '', place: '', red: false });
					const donors = [];
					for (const model of MODELS) {
						const release = { route: 'own' as const, document: '', on: '2026-03-01' };
						const { number } = await takeIn(ctx, {
							maker: 'Ondrake',
							model,
							class: 'WB',
							fittings: ['recoil'],
							cause: 'worn',
							sureness: 'seen',
							release
						});
						await parkDonor(ctx, number, {});
						donors.push(number);
					}
					const world: World = { shop, donors, tags: [] };
					for (const one of steps) await act(world, one);
					const scan = await everything(shop);
					const kind = pick(KINDS, at);
					const model = pick(MODELS, at);
					const said = { coil: 'ignition coil', 'carb-float': 'carb', recoil: 'recoil' }[kind]!;
					const isKind = ({ row }: Seen) => row.kind === kind;
					const onEngine = (seen: Seen) =>
						isKind(seen) && isHere(seen) && seen.engine === engineKey(`Ondrake ${model}`);
					await compare(shop, 'kind', { q: said }, scan, (seen) => isKind(seen) && isHere(seen));
					if (scan.parts.some(onEngine))
						await compare(shop, 'engine', { q: `${said} ${model}` }, scan, onEngine);
					const state = pick(STANDS, at);
					await compare(
						shop,
						'state',
						{ q: said, state },
						scan,
						(seen) => isKind(seen) && seen.row.state === state
					);
					const [low, high] = proofRange('tested');
					await compare(
						shop,
						'proof',
						{ q: said, proof: 'tested' },
						scan,
						(seen) => isKind(seen) && isHere(seen) && seen.proved >= low && seen.proved <= high
					);
					await compare(
						shop,
						'price',
						{ q: said, price: '10-25' },
						scan,
						({ item, ...seen }) =>
							isKind({ item, ...seen }) &&
							isHere({ item, ...seen }) &&
							item.askedCents !== null &&
							item.askedCents >= 1000 &&
							item.askedCents < 2500
					);
					await compare(
						shop,
						'unpriced',
						{ q: said, price: 'none' },
						scan,
						(seen) => isKind(seen) && isHere(seen) && seen.item.askedCents === null
					);
					await compare(
						shop,
						'bin',
						{ q: 'K3' },
						scan,
						(seen) => isHere(seen) && (seen.item.bin?.startsWith('K3') ?? false)
					);
					const number = pick(NUMBERS, at);
					const keys = serving(scan, number);
					const exact = (seen: Seen) =>
						isHere(seen) && seen.row.numberKeys.some((key) => keys.has(key));
					if (scan.parts.some((seen) => seen.row.numberKeys.some((key) => keys.has(key))))
						await compare(shop, 'number', { q: number }, scan, exact);
				}
			),
			{ numRuns: 8 }
		);
	}, 90_000);
});
