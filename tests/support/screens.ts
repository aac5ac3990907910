import type { Page } from '@playwright/test';

/** What the demo shop has to show of each sort of page. */
export interface Shown {
	part: string;
	held: string;
	out: string;
	scrapped: string;
	bare: string;
	donor: string;
	whole: string;
	parked: string;
	bench: string;
	bin: string;
	price: string;
	want: string;
	customer: string;
}

interface Item {
	tag: string;
	kind: string;
	bin: string | null;
	photo: string | null;
}

const SHOP = '/osiergate';
/** Kinds that anybody may buy. */
const PLAIN = ['coil', 'muffler', 'recoil', 'starter12', 'stator', 'carb-float'];

/** Looks for one of each in the shop as it stands, whatever was done to it before. */
export async function findShown(page: Page): Promise<Shown> {
	const parts = async (state: string) => {
		const answer = await page.request.get(`/api${SHOP}/parts?state=${state}&limit=100`);
		const { items }: { items: Item[] } = await answer.json();
		return items;
	};
	const donors = async (state: string) => {
		await page.goto(`${SHOP}/donors?state=${encodeURIComponent(state)}`);
		const newest = page.locator('a.tag-link').first();
		return (await newest.getAttribute('href'))?.split('/').at(-1) ?? '';
	};
	const shelved = (await parts('shelved')).filter(({ bin }) => bin);
	await page.goto(`${SHOP}/prices`);
	const price = await page.locator('.ledger tbody a').first().getAttribute('href');
	const link = async (list: string, one: string) => {
		await page.goto(`${SHOP}/${list}`);
		const found = page.locator(`main a[href^='${SHOP}/${one}']`).first();
		return (await found.getAttribute('href'))?.split('/').at(-1) ?? '';
	};
	const first = async (state: string) => (await parts(state))[0]?.tag ?? '';
	return {
		part: shelved.find(({ photo, kind }) => photo && PLAIN.includes(kind))?.tag ?? '',
		bare: shelved.find(({ photo }) => !photo)?.tag ?? '',
		bin: shelved[0]?.bin ?? '',
		held: await first('held'),
		out: await first('out'),
		scrapped: await first('scrapped'),
		donor: await donors('stripped'),
		whole: await donors('whole'),
		parked: await donors('parked'),
		bench: await donors('on the bench'),
		price: price?.split('/').at(-1) ?? '',
		want: await link('wants', 'wants/W'),
		customer: await link('customers?q=e', 'customers/')
	};
}

/** Every page of a shop, by its address. */
export const pagesOf = (one: Shown): string[] =>
	[
		...['parts', 'parts?q=starter', 'parts?q=zzyzx', 'parts/new'],
		...['parts/new?kind=recoil', `parts/${one.part}`, `parts/${one.bare}`, `parts/${one.held}`],
		...[`parts/${one.out}`, `parts/${one.scrapped}`, `parts/${one.part}/edit`],
		...['hold', 'move', 'use', 'prove', 'scrap'].map((verb) => `parts/${one.part}/${verb}`),
		...[`parts/${one.out}/back`, 'donors', 'donors/new'],
		...[
			`donors/${one.donor}`,
			`donors/${one.donor}/label`,
			`donors/${one.whole}`,
			`donors/${one.parked}`,
			`donors/${one.bench}`
		],
		...['worth/calculator', 'worth/calculator?kind=starter12&new=136&copy=58&have=2'],
		...[`donors/${one.bench}?minutes=30`, `donors/${one.bench}/log?minutes=15`],
		...[`donors/${one.bench}/bench`, `donors/${one.bench}/bench?kind=flywheel`],
		...[`donors/${one.whole}/triage`, `donors/${one.bench}/triage`],
		...[`donors/${one.bench}/log`, `donors/${one.bench}/log?kind=flywheel`],
		...['bins', 'bins/new', `bins/${one.bin}`, 'prices', 'prices/new', `prices/${one.price}`],
		...['wants', 'wants?show=closed', 'wants/new', `wants/${one.want}`, `wants/${one.want}/edit`],
		...['customers', 'customers/new', `customers/${one.customer}`, 'people/letters'],
		...['people', 'people/shop', 'worth?kind=flywheel', 'undo', 'labels'],
		...[`labels?tag=${one.part}&stock=a4`, 'labels/settings?stock=a4', 'labels?tag=00000'],
		...['scan', `scan?part=${one.part}`]
	].map((path) => `${SHOP}/${path}`);

/** The screens that are used with one gloved thumb, each with its one main action, if it has one. */
export const phoneScreens = (one: Shown): { path: string; main: string | null }[] =>
	(
		[
			['donors/new', 'Take in'],
			[`donors/${one.bench}/log`, null],
			[`donors/${one.bench}/bench?kind=muffler`, '(Kept|Off, to scrap)'],
			[`donors/${one.whole}/triage`, 'Keep the answers'],
			[`donors/${one.bench}/log?kind=carb-float`, 'Kept'],
			['parts?q=starter', null],
			[`parts/${one.part}/hold`, 'Hold it'],
			[`parts/${one.part}/move`, 'Move it'],
			[`parts/${one.part}/use`, 'Sold'],
			[`parts/${one.out}/back`, 'Take it back']
		] as const
	).map(([path, main]) => ({ path: `${SHOP}/${path}`, main }));
