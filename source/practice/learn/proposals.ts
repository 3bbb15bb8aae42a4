/** What practice would change in the documents, field by field. Nothing of it is done before somebody accepts it. */
import {type Json, type JsonObject, type Path, valueAt} from '../../documents/json.ts';
import {quantityOf} from '../../documents/quantity.ts';
import type {Dimension} from '../../documents/units.ts';
import {mphMps} from '../../drivetrain/constants.ts';
import {harmonicRolloutM} from '../../drivetrain/tire.ts';
import {carAt} from '../../planning/situations.ts';
import type {Findings, Spread} from '../find/findings.ts';
import {edgesFromHz} from '../find/notes.ts';
import type {Compared} from './compared.ts';
import type {Learning, Subject} from './learn.ts';
import {type Known, known, type Reading} from './reading.ts';
import {heldSpeedSe} from './seen.ts';
import {type Readers, writtenCoefficient, writtenNumber, writtenQuantity} from './written.ts';

export type DocumentName = 'track' | 'car';
export type Written = string | number;

/** One field as it is to be written. */
export type Write = {
	readonly document: DocumentName;
	readonly path: Path;
	readonly value: Written;
	/** What stands there; undefined where nothing does. */
	readonly before: Written | undefined;
};

export type Proposal = {
	/** What it is accepted by: `rollout`, `drag`, `exit:Back`. */
	readonly name: string;
	/** What people call it: "left rollout". One a write. */
	readonly rows: readonly ProposalRow[];
};

export type ProposalRow = Write & {
	readonly label: string;
	/** As it holds now, wherever it comes from; empty where nothing does. */
	readonly now: string;
};

export type DocumentsAsWritten = {readonly track: JsonObject; readonly car: JsonObject};

/** All that a learning would change, in the order of the table. A value that is written as it stands already is no change. */
export function proposalsOf(
	subject: Subject,
	documents: DocumentsAsWritten,
	learning: Learning,
	findings: Findings | undefined,
	readers: Readers,
): Proposal[] {
	const make = new Maker(documents, readers);
	const all = [
		...rolloutProposals(subject, learning, make),
		...forceProposals(subject, learning, make),
		...straightProposals(learning, findings, make),
		...(learning.source === 'measured' || isCoarse(findings)
			? []
			: learning.compared.flatMap(one => measuredProposal(one, make))),
	];
	return all
		.map(proposal => ({...proposal, rows: proposal.rows.filter(({value, before}) => value !== before)}))
		.filter(({rows}) => rows.length > 0);
}

/** Makes rows from numbers in SI, in the units that stand in the documents. */
class Maker {
	readonly #documents: DocumentsAsWritten;
	readonly #readers: Readers;

	constructor(documents: DocumentsAsWritten, readers: Readers) {
		this.#documents = documents;
		this.#readers = readers;
	}

	/** `elsewhere` is where the number comes from while the field itself is empty. */
	quantity(
		label: string,
		document: DocumentName,
		path: Path,
		value: Known,
		dimension: Dimension,
		elsewhere?: {document: DocumentName; path: Path; unlessGiven?: string},
	): ProposalRow {
		const before = this.#at(document, path);
		const now = before ?? (elsewhere && (this.#at(elsewhere.document, elsewhere.path) ?? elsewhere.unlessGiven));
		const written =
			this.#saysTheSame(before, value, dimension) ?? writtenQuantity(value, dimension, now, this.#readers);
		return {label, document, path, before, now: now === undefined ? '' : String(now), value: written};
	}

	/** What stands there, where it was learned before and the new number is within half its uncertainty: no news. */
	#saysTheSame(before: Written | undefined, {value, se}: Known, dimension: Dimension): Written | undefined {
		const reading = typeof before === 'string' ? quantityOf(before, dimension) : undefined;
		if (!reading?.ok || reading.uncertainty === undefined) return undefined;
		const isAsSure = reading.uncertainty > 0 && Math.abs(Math.log(se / reading.uncertainty)) <= Math.log(2);
		return isAsSure && Math.abs(value - reading.value) <= se / 2 ? before : undefined;
	}

	plain(label: string, path: Path, value: Written, elsewhere?: {document: DocumentName; path: Path}): ProposalRow {
		const before = this.#at('track', path);
		const now = before ?? (elsewhere && this.#at(elsewhere.document, elsewhere.path));
		return {label, document: 'track', path, before, now: now === undefined ? '' : String(now), value};
	}

	has(document: DocumentName, path: Path): boolean {
		return this.#at(document, path) !== undefined;
	}

	#at(document: DocumentName, path: Path): Written | undefined {
		const value: Json | undefined = valueAt(this.#documents[document], path);
		return typeof value === 'string' || typeof value === 'number' ? value : undefined;
	}

	/** The index of the engine that runs at a type of track. */
	engineFor(type: string): number {
		const engines = valueAt(this.#documents.car, ['engines']);
		const runsHere = (engine: Json) => {
			const types = valueAt(engine, ['for']);
			return Array.isArray(types) && types.includes(type);
		};
		return Array.isArray(engines) ? engines.findIndex(runsHere) : -1;
	}
}

const row = (name: string, one: ProposalRow): Proposal => ({name, rows: [one]});

/** Both rollouts times the factor; growth where it stands: with the track if that has its own, else with the car. */
function rolloutProposals({car, track}: Subject, {circumference}: Learning, make: Maker): Proposal[] {
	if (circumference === undefined) return [];
	const {rolloutM, factor, growth} = circumference;
	const {tires} = carAt(track, car);
	const mean = harmonicRolloutM(tires.leftM, tires.rightM);
	const side = (which: 'left' | 'right', nowM: number) =>
		make.quantity(
			`rollout ${which}`,
			'track',
			['car', 'tires', which],
			known(nowM * factor, (rolloutM.se * nowM) / mean),
			'length',
			{document: 'car', path: ['tires', which]},
		);
	const rollout: Proposal = {name: 'rollout', rows: [side('left', tires.leftM), side('right', tires.rightM)]};
	if (growth === undefined) return [rollout];
	const here: Path = ['car', 'tires', 'growth'];
	const inTrack = make.has('track', here);
	const path: Path = inTrack ? here : ['tires', 'growth'];
	const grown = make.quantity('growth at 100 mph', inTrack ? 'track' : 'car', path, growth, 'share', {
		document: 'car',
		path: ['tires', 'growth'],
		unlessGiven: '0 %',
	});
	return [rollout, row('growth', grown)];
}

function forceProposals({car, track}: Subject, {anchor, grip}: Learning, make: Maker): Proposal[] {
	const here = carAt(track, car);
	const scaled = (now: number, factor: Known) => known(now * factor.value, now * factor.se);
	const proposals: Proposal[] = [];
	if (anchor?.drag !== undefined) {
		const value = scaled(here.dragAreaM2, anchor.drag);
		const elsewhere = {document: 'car', path: ['dragArea']} as const;
		proposals.push(row('drag', make.quantity('drag area', 'track', ['car', 'dragArea'], value, 'area', elsewhere)));
	}
	if (anchor?.power !== undefined) {
		const engine = make.engineFor(track.type);
		const now = here.engines[engine]?.power ?? 1;
		const elsewhere = {document: 'car', path: ['engines', engine, 'power'], unlessGiven: '100 %'} as const;
		const value = scaled(now, anchor.power);
		proposals.push(row('power', make.quantity('power', 'track', ['car', 'power'], value, 'share', elsewhere)));
	}
	if (grip?.factor !== undefined) {
		const value = writtenCoefficient(scaled(here.grip, grip.factor));
		proposals.push(row('grip', make.plain('grip', ['car', 'grip'], value, {document: 'car', path: ['grip']})));
	}
	return proposals;
}

/**
 * Exit and minimum as a lap has them: with the spread from lap to lap, which is what a race brings, not that of the median. A
 * minimum only where the track has one.
 */
function straightProposals({readings}: Learning, findings: Findings | undefined, make: Maker): Proposal[] {
	const found = findings?.straights.filter(({index}) => readings.some(reading => reading.index === index)) ?? [];
	return found.flatMap(({index, name, exitMps, minimumMps}) => {
		const speed = (field: 'exit' | 'minimum', spread: Spread | undefined): Proposal[] => {
			const path: Path = ['straights', index, field];
			if (spread === undefined || !make.has('track', path) || (field === 'exit' && isCoarse(findings))) return [];
			const value = known(spread.median, spreadOf(spread));
			return [row(`${field}:${name}`, make.quantity(`${field} ${name}`, 'track', path, value, 'speed'))];
		};
		return [...speed('exit', exitMps), ...speed('minimum', minimumMps)];
	});
}

/** Its first and last samples at full throttle are not the exit and the end: the car is faster than at the one, slower than at the other. */
const isCoarse = (findings: Findings | undefined): boolean =>
	findings !== undefined && findings.log.rateHz < edgesFromHz;

/** From lap to lap; a few laps alike are no proof that the next one will be. */
function spreadOf({sd, count}: Spread): number {
	return Math.max(sd ?? 0, count < fewLaps ? fewLapsMps : leastSpreadMps);
}
const fewLaps = 5;
const fewLapsMps = 0.5 * mphMps;
const leastSpreadMps = 0.1 * mphMps;

/**
 * The measurement of a straight as a whole, so that no part of an older one stays beside the new ones. A speed that is only what
 * the RPM says is written where one stood; else the RPM alone, which then follows a later circumference.
 */
function measuredProposal({reading, after}: Compared, make: Maker): Proposal[] {
	const {index, name, candidate, gear = after?.endGear} = reading;
	// What is measured is the highest: of a car that slows the exit, whose RPM the end does not tell.
	const endRpm = slows(reading) ? undefined : reading.endRpm;
	const at = (field: string): Path => ['straights', index, 'measured', field];
	const label = (what: string) => `${what} ${name}`;
	const modeled = after && known(after.endMps, heldSpeedSe);
	const endMps = reading.speedSeen
		? highestOf(reading)
		: make.has('track', at('end'))
			? (reading.endMps ?? modeled)
			: undefined;
	return [
		{
			name: `measured:${name}`,
			rows: [
				...(endMps ? [make.quantity(label('measured speed'), 'track', at('end'), endMps, 'speed')] : []),
				...(endRpm ? [make.plain(label('measured RPM'), at('rpm'), writtenNumber(endRpm))] : []),
				make.plain(label('measured with pair'), at('pair'), candidate.pairName),
				make.plain(label('measured with set'), at('gearbox'), candidate.gearbox.name),
				...(gear === undefined ? [] : [make.plain(label('measured in gear'), at('gear'), gear)]),
			],
		},
	];
}

const slows = ({exitMps, endMps}: Reading): boolean =>
	exitMps !== undefined && endMps !== undefined && exitMps.value > endMps.value;

const highestOf = (reading: Reading): Known | undefined =>
	slows(reading) ? known(reading.exitMps!.value, reading.endMps!.se) : reading.endMps;
