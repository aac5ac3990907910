export const CUSTOMER_KINDS = ['customer', 'neighbour shop'] as const;
export type CustomerKind = (typeof CUSTOMER_KINDS)[number];

export const LETTER_STATES = ['waiting', 'sent', 'failed'] as const;
export type LetterState = (typeof LETTER_STATES)[number];

/** What stands where a name was, once it is deleted. */
export const ERASED_SAID: Record<CustomerKind, string> = {
	customer: 'a customer',
	'neighbour shop': 'a neighbour shop'
};
