/** Small valid documents to change in tests. The numbers mean nothing. */
type Json = Record<string, unknown>;

export function trackDocument(changes: Json = {}): Json {
	return {
		kind: 'track',
		version: 1,
		name: 'Sample',
		type: 'short',
		straights: [{name: 'Front', exit: '88 mph', length: '650 ft'}],
		...changes,
	};
}

export function carDocument(changes: Json = {}): Json {
	return {
		kind: 'car',
		version: 1,
		name: 'Sample',
		mass: '3650 lb',
		rearShare: 0.5,
		dragArea: '0.95 m^2',
		downforceArea: '1.6 m^2',
		rolling: 0.018,
		grip: 1.25,
		wheelInertia: '4 kg m^2',
		engines: [engine()],
		gearboxes: [{name: 'A', ratios: [2.9, 2.04, 1.58, 1.24, 1]}],
		finalDrive: 3.25,
		efficiency: 0.92,
		tires: {left: '86.4 in', right: '86.6 in'},
		rack: {pairs: [{driving: 33, driven: 38}]},
		...changes,
	};
}

export function engine(changes: Json = {}): Json {
	const curve = [
		{rpm: 4000, torque: '405 lbf ft'},
		{rpm: 6000, torque: '480 lbf ft'},
		{rpm: 9000, torque: '390 lbf ft'},
	];
	return {name: 'Open', for: ['short', 'road'], rpmLimit: 9200, inertia: '0.14 kg m^2', curve, ...changes};
}

export const text = (document: unknown) => JSON.stringify(document, null, '\t');
