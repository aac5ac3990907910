// Said with a part without telling which: they narrow nothing.
const SAID = `a about all also an and any anyone anything are at be been bit black blue both brown but by
	can clean colour could did do does dirty engine find for from fit fits get gold good got gray green grey had
	has have hers his how i in is it its just like looking machine made maybe me mower my need needs new next no
	not of off ok old on one or orange other our out over part parts piece please purple red really same see side
	silver so some somebody something spare stuff tested than that the their them there they thing thingy things
	this to too type under unit up us use used want was we what when where which white who will wit with without
	work works yellow you your`;

/** Words that are passed over while looking: colours, articles, old and good. */
export const WEAK_WORDS: ReadonlySet<string> = new Set(SAID.split(/\s+/));
