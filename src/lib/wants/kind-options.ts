import { kinds } from '../trade';

/** The kinds that somebody may wait for; handed to pages by their load, so that phones need no trade data. */
export const kindOptions = kinds
	.filter(({ reuse }) => reuse !== 'never')
	.map(({ id, name, system }) => ({ value: id as string, label: name, group: system as string }));
