/** A place in the navigation. Without `where` it shows on phones and desks alike. */
export interface NavItem {
	href: string;
	label: string;
	current?: boolean;
	where?: 'phone' | 'desk';
	/** How much is new there, said beside the label. */
	count?: { number: number; said: string };
}
