/** What several fields of a car must be together. Each rule looks only at what could be read. */
import {listRule, type Report, reportRepeated, rule} from './fields.ts';

type Named = {name?: unknown};
const nameOf = ({name}: Named) => name;

export const curveRules = () =>
	listRule<{rpm?: unknown; torque?: unknown} | undefined>((points, report) => {
		for (let i = 1; i < points.length; i++) {
			const [before, rpm] = [points[i - 1]?.rpm, points[i]?.rpm];
			if (typeof before !== 'number' || typeof rpm !== 'number' || rpm > before) continue;
			report([i, 'rpm'], `more than the ${before} of the point before`);
		}
		const isDead = points.length > 0 && points.every(point => point?.torque === 0);
		if (isDead) report([], 'torque above 0 at one point at least', {found: 'no torque at any point'});
	});

export const engineRules = () =>
	rule<{for?: readonly unknown[]}>((engine, report) => {
		const types = Array.isArray(engine.for) ? engine.for : [];
		types.forEach((type, i) => {
			if (types.indexOf(type) < i) report(['for', i], 'each type once', {found: `a second "${type}"`});
		});
	});

export const ratioRules = () =>
	listRule<unknown>((ratios, report) => {
		for (let i = 1; i < ratios.length; i++) {
			const [before, ratio] = [ratios[i - 1], ratios[i]];
			if (typeof before !== 'number' || typeof ratio !== 'number' || ratio <= before) continue;
			report([i], `no more than the ${before} of the gear before`);
		}
	});

type InventoryValues = {
	gears?: readonly {gear?: unknown}[];
	smallestStep?: unknown;
	largestStep?: unknown;
};

export const inventoryRules = () =>
	rule<InventoryValues>(({gears, smallestStep, largestStep}, report) => {
		if (typeof smallestStep === 'number' && typeof largestStep === 'number' && smallestStep > largestStep)
			report(['largestStep'], `no less than the "smallestStep" ${smallestStep}`);
		const places = new Set(listOf(gears).map(one => one?.gear));
		const highest = Math.max(0, ...[...places].filter(place => typeof place === 'number'));
		for (let gear = 1; gear < Math.min(highest, mostGears); gear++) {
			if (places.has(gear)) continue;
			report(['gears'], `a gear for every place up to ${highest}`, {found: `none for gear ${gear}`});
			return;
		}
	});

/** As the field allows: what is beyond is reported there. */
const mostGears = 20;

type EfficiencyValues = {
	efficiency?: unknown;
	efficiencies?: readonly unknown[] | undefined;
	gearboxes?: readonly unknown[];
	gearInventory?: InventoryValues | undefined;
};

export const efficiencyRules = () =>
	rule<EfficiencyValues>(({efficiency, efficiencies, gearboxes, gearInventory}, report) => {
		if (efficiency === undefined && efficiencies === undefined)
			report(['efficiency'], 'a share like 0.92, or "efficiencies", one a gear');
		if (efficiencies === undefined) return;
		if (efficiency !== undefined) report(['efficiencies'], 'either "efficiency" or "efficiencies"');
		if (!Array.isArray(efficiencies)) return;
		for (const [i, gearbox] of (listOf(gearboxes) as {name?: unknown; ratios?: unknown}[]).entries()) {
			const ratios = gearbox?.ratios;
			if (!Array.isArray(ratios) || ratios.length === efficiencies.length) continue;
			const which = typeof gearbox.name === 'string' ? `"${gearbox.name}"` : `number ${i + 1}`;
			report(['efficiencies'], `one for each of the ${ratios.length} gears of gearbox ${which}`);
		}
		const places = listOf(gearInventory?.gears).map(one => one?.gear);
		const highest = Math.max(0, ...places.filter(place => typeof place === 'number'));
		if (highest > 0 && highest !== efficiencies.length)
			report(['efficiencies'], `one for each of the ${highest} gears of "gearInventory"`);
	});

type PairValues = {driving?: unknown; driven?: unknown};
type CarValues = {
	wheelbase?: unknown;
	cgHeight?: unknown;
	engines?: readonly unknown[];
	gearboxes?: readonly Named[];
	rack?: {pairs?: readonly PairValues[]; eitherShaft?: unknown};
	installed?: {pair?: PairValues; gearbox?: unknown} | undefined;
	rules?: Readonly<Record<string, {gearboxes?: readonly unknown[] | undefined} | undefined>> | undefined;
};

export const carRules = () =>
	rule<CarValues>((car, report) => {
		if (car.wheelbase !== undefined && car.cgHeight === undefined) report(['cgHeight'], 'a height beside "wheelbase"');
		if (car.cgHeight !== undefined && car.wheelbase === undefined) report(['wheelbase'], 'a length beside "cgHeight"');
		reportRepeated(listOf(car.engines), nameOf, index => ['engines', index, 'name'], report);
		reportRepeated(listOf(car.gearboxes), nameOf, index => ['gearboxes', index, 'name'], report);
		reportRepeated(listOf(car.rack?.pairs), pairName, index => ['rack', 'pairs', index], report);
		reportUnknownGearboxes(car, report);
		reportInstalledPair(car, report);
	});

function reportUnknownGearboxes({gearboxes, installed, rules}: CarValues, report: Report): void {
	const names = listOf(gearboxes).map(gearbox => gearbox?.name);
	// A name that cannot be read may be the one that is meant.
	if (names.length === 0 || names.some(name => typeof name !== 'string')) return;
	const checked = (name: unknown, path: PropertyKey[]) => {
		if (typeof name !== 'string' || names.includes(name)) return;
		report(path, `a gearbox of this car: ${names.map(known => `"${known}"`).join(', ')}`);
	};
	checked(installed?.gearbox, ['installed', 'gearbox']);
	for (const [type, allowed] of Object.entries(rules ?? {})) {
		listOf(allowed?.gearboxes).forEach((name, i) => {
			checked(name, ['rules', type, 'gearboxes', i]);
		});
	}
}

function reportInstalledPair({installed, rack}: CarValues, report: Report): void {
	const name = pairName(installed?.pair);
	const pairs = listOf(rack?.pairs);
	if (name === undefined || pairs.length === 0) return;
	const flipped = (pair: PairValues | null) => pairName({driving: pair?.driven, driven: pair?.driving});
	const names = pairs.flatMap(pair =>
		rack?.eitherShaft === true ? [pairName(pair), flipped(pair)] : [pairName(pair)],
	);
	if (!names.includes(name)) report(['installed', 'pair'], 'a pair of this rack');
}

function pairName(pair: PairValues | undefined): string | undefined {
	const {driving, driven} = pair ?? {};
	return typeof driving === 'number' && typeof driven === 'number' ? `${driving}/${driven}` : undefined;
}

function listOf<T>(value: readonly T[] | undefined): readonly T[] {
	return Array.isArray(value) ? value : [];
}
