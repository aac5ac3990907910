/** The last moment of a calendar day where the shop is. */
export function endOfDay(day: string, timeZone: string): Date {
	const utc = Date.parse(`${day}T23:59:59Z`);
	const first = new Date(utc - offsetMs(new Date(utc), timeZone));
	return new Date(utc - offsetMs(first, timeZone));
}

/** How far the zone's clock is ahead of UTC at a moment. */
function offsetMs(moment: Date, timeZone: string): number {
	const parts = new Intl.DateTimeFormat('en-US', {
		timeZone,
		hourCycle: 'h23',
		year: 'numeric',
		month: 'numeric',
		day: 'numeric',
		hour: 'numeric',
		minute: 'numeric',
		second: 'numeric'
	}).formatToParts(moment);
	const of = (type: string) => Number(parts.find((one) => one.type === type)?.value);
	const shown = Date.UTC(
		of('year'),
		of('month') - 1,
		of('day'),
		of('hour'),
		of('minute'),
		of('second')
	);
	return shown - Math.floor(moment.getTime() / 1000) * 1000;
}
