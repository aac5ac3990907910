/** What somebody signs who leaves an engine for its parts. Usual words; the shop's lawyer may have better ones. */
export const releaseWords = (engine: string, serial: string, shop: string): string =>
	`I own this engine (${engine}${serial ? `, serial ${serial}` : ''}). I give it with all its parts to ${shop}, ` +
	'to take apart, sell or scrap as it sees fit. I ask nothing for it beyond what is written here.';
