/** A place in the navigation. Without `where` it shows on phones and desks alike. */
export interface NavItem {
	href: string;
	label: string;
	current?: boolean;
	where?: 'phone' | 'desk';
}
