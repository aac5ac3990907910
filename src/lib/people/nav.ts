import type { NavItem } from '$lib/ui/nav';
import type { Ability } from './role';

/** The ways through a shop; what a role cannot open is not offered. Four on the phone, all on the desk. */
export function navItems(slug: string, path: string, may: Record<Ability, boolean>): NavItem[] {
	const at = (area: string) => `/${slug}/${area}`;
	const item = (area: string, label: string, where?: 'phone' | 'desk'): NavItem => ({
		href: at(area),
		label,
		current: path === at(area) || path.startsWith(`${at(area)}/`),
		...(where ? { where } : {})
	});
	return [
		item('parts', 'Find'),
		item('donors', 'Donors'),
		item('bins', 'Bins'),
		item('prices', 'Prices', 'desk'),
		...(may['see costs'] ? [item('worth', 'Worth', 'desk')] : []),
		item('people', 'More')
	];
}
