import type { NavItem } from '$lib/ui/nav';
import type { Ability } from './role';

interface Place {
	/** Under the shop's address. */
	area: string;
	label: string;
	needs: Ability;
	/** Always at hand: on the phone's bar too. */
	first?: true;
	/** Not on the desk's bar, only on the page of all. */
	rare?: true;
}

/** Every place of a shop, by where it is used. */
const GROUPS: readonly { title: string; places: readonly Place[] }[] = [
	{
		title: 'Shelf',
		places: [
			{ area: 'parts', label: 'Find', needs: 'see', first: true },
			{ area: 'donors', label: 'Donors', needs: 'see', first: true },
			{ area: 'bins', label: 'Bins', needs: 'see', first: true },
			{ area: 'walks', label: 'Walks', needs: 'see' },
			{ area: 'labels', label: 'Labels', needs: 'see' },
			{ area: 'scan', label: 'Scan', needs: 'see', rare: true },
			{ area: 'bins/red', label: 'Red bin', needs: 'see', rare: true },
			{ area: 'parts/new', label: 'Log old stock', needs: 'work', rare: true }
		]
	},
	{
		title: 'Counter',
		places: [
			{ area: 'wants', label: 'Wants', needs: 'trade' },
			{ area: 'customers', label: 'Customers', needs: 'trade', rare: true },
			{ area: 'prices', label: 'Prices', needs: 'see' }
		]
	},
	{
		title: 'Yard',
		places: [
			{ area: 'scrap', label: 'Scrap runs', needs: 'work' },
			{ area: 'register', label: 'Register', needs: 'work' },
			{ area: 'scrap/waste', label: 'Used oil and old fuel', needs: 'work', rare: true }
		]
	},
	{
		title: 'Money',
		places: [
			{ area: 'worth', label: 'Worth', needs: 'see costs' },
			{ area: 'worth/calculator', label: 'Calculator', needs: 'see terms', rare: true }
		]
	},
	{
		title: 'Shop',
		places: [
			{ area: 'people/shop', label: 'Shop settings', needs: 'run', rare: true },
			{ area: 'people/letters', label: 'Letters', needs: 'run', rare: true }
		]
	}
];

type Abilities = Record<Ability, boolean>;

/** The deepest place that an address lies in. */
function placeAt(slug: string, path: string): string | undefined {
	const areas = [...GROUPS.flatMap(({ places }) => places.map(({ area }) => area)), 'people'];
	return areas
		.filter((area) => `${path}/`.startsWith(`/${slug}/${area}/`))
		.sort((a, b) => b.length - a.length)[0];
}

/** The bar of places: four on the phone, most on the desk; what a role cannot open is not offered. */
export function navItems(
	slug: string,
	path: string,
	may: Abilities,
	fresh: { wants: number } = { wants: 0 }
): NavItem[] {
	const at = placeAt(slug, path);
	const places = GROUPS.flatMap((group) => group.places).filter(
		({ needs, rare }) => may[needs] && !rare
	);
	const items = places.map(({ area, label, first }): NavItem => ({
		href: `/${slug}/${area}`,
		label,
		current: at === area || (at?.startsWith(`${area}/`) ?? false),
		...(first ? {} : { where: 'desk' }),
		...(area === 'wants' && fresh.wants > 0 ? { count: { number: fresh.wants, said: 'new' } } : {})
	}));
	const more = (where: 'phone' | 'desk'): NavItem => ({
		href: `/${slug}/people`,
		label: 'More',
		where,
		current: at !== undefined && !items.some((one) => one.current && shows(one, where)),
		...(where === 'phone' && fresh.wants > 0
			? { count: { number: fresh.wants, said: fresh.wants === 1 ? 'new want' : 'new wants' } }
			: {})
	});
	return [...items, more('phone'), more('desk')];
}

const shows = ({ where }: NavItem, on: 'phone' | 'desk') => where === undefined || where === on;

/** The places that are not on the phone's bar, by where they are used. */
export const morePlaces = (slug: string, may: Abilities) =>
	GROUPS.map(({ title, places }) => ({
		title,
		places: places
			.filter(({ needs, first }) => may[needs] && !first)
			.map(({ area, label }) => ({ href: `/${slug}/${area}`, label }))
	})).filter(({ places }) => places.length > 0);
