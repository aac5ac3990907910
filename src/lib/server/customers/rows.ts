import type { CustomerInput } from '$lib/customers/input';
import { foundBy, phoneKey } from '$lib/customers/reach';

/** What is kept of somebody, with the keys by which they are found. */
export const columnsOf = ({ name, kind, phone, email, note }: CustomerInput) => ({
	...{ name, kind, phone, email, note },
	phoneKey: phoneKey(phone),
	foundBy: foundBy({ name, phone, email })
});
