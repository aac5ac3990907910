/** Which drawing of /drawings.svg stands for which kinds. A kind that is not here gets its system's, or the plain part. */
const kindsOf: Record<string, string> = {
	carburetor: 'carb-float carb-diaph throttlebody',
	bowl: 'carb-bowl primer fuel-valve',
	tank: 'fuel-tank fuel-cap fuelgauge sawtank',
	pump: 'fuel-pump oilpump pwpump pumpvolute unloader',
	hose: 'fuel-hose pwgun intake oilcooler',
	airbox: 'airbox airfilter breather heaterbox',
	coil: 'coil trigger points',
	plug: 'plug boot',
	flywheel: 'flywheel ringgear',
	recoil: 'recoil cup recoil-kit',
	starter: 'starter12 starter120 drive',
	solenoid: 'solenoid fuel-sol',
	stator: 'stator',
	switch: 'regulator keyswitch interlock ptoswitch lowoil avr hourmeter',
	wire: 'harness cable brakecable',
	muffler: 'muffler guard',
	gasket: 'exgasket hgasket seal rings',
	shroud: 'shroud tins screen hood sawcover',
	bottle: 'dipstick oilfilter',
	sump: 'sump',
	gear: 'govgear reduction',
	lever: 'govarm ctrl choke airvane bail heightadj brake chainbrake steering chutecrank',
	spring: 'govspring vspring avspring isolator',
	head: 'head vcover cyl',
	valves: 'valves rocker tappet',
	cam: 'cam',
	piston: 'piston',
	rod: 'rod',
	crank: 'crank balance',
	bearing: 'bearing',
	block: 'block shortblock sawcase',
	pulley: 'pulley idler belt adapter',
	clutch: 'cclutch eclutch sawclutch friction',
	gearcase: 'sptrans hydro auger gearhead spindle frontspindle',
	bolt: 'hardware headbolt key bracket',
	blade: 'mblade tines guidebar chute',
	wheel: 'wheel seat',
	generator: 'genhead brushholder',
	panel: 'panel',
	battery: 'battery'
};

const systems: Record<string, string> = {
	Fuel: 'carburetor',
	Air: 'airbox',
	Ignition: 'coil',
	Starting: 'recoil',
	'Charging / electrical': 'switch',
	Exhaust: 'muffler',
	'Cooling / shroud': 'shroud',
	Lubrication: 'sump',
	'Governor / controls': 'lever',
	'Valve train': 'valves',
	'Top end': 'piston',
	'Bottom end': 'crank',
	'Reduction / PTO': 'pulley',
	'Fasteners / brackets': 'bolt'
};

const drawn = new Map(
	Object.entries(kindsOf).flatMap(([symbol, kinds]) =>
		kinds.split(' ').map((kind) => [kind, symbol] as const)
	)
);

/** The drawing of a kind of part. */
export function kindSymbol(kind: string, system?: string): string {
	return drawn.get(kind) ?? systems[system ?? ''] ?? 'part';
}

const engines: Record<string, string> = {
	WB: 'engine-vertical',
	R1: 'engine-vertical',
	R2: 'engine-twin',
	SA: 'engine-saw',
	TR: 'engine-saw'
};

/** The drawing of an engine by its class code. */
export function engineSymbol(engineClass: string): string {
	return engines[engineClass] ?? 'engine-horizontal';
}
