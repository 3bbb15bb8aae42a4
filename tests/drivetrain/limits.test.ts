import {describe, expect, test} from 'vitest';
import type {Car, Engine, Rules} from '../../source/drivetrain/car.ts';
import {engineFor, limitInForce} from '../../source/drivetrain/limits.ts';

const engine = (name: string, types: Engine['for'], rpmLimit = 9200) => ({name, for: types, rpmLimit}) as Engine;
const rules = (rpmLimit: number | undefined): Rules => ({rpmLimit, gearboxes: undefined, pairs: undefined});

describe('the engine for a track', () => {
	const open = engine('open', ['short', 'road']);
	const restricted = engine('restricted', ['superspeedway', 'short']);
	const car = {engines: [open, restricted]} as unknown as Car;

	test('is the first build that lists its type', () => {
		expect(engineFor(car, 'short')).toBe(open);
		expect(engineFor(car, 'superspeedway')).toBe(restricted);
	});

	test('is undefined where no build lists it', () => {
		expect(engineFor(car, 'intermediate')).toBeUndefined();
	});
});

describe('the limit in force', () => {
	const build = engine('open', ['short'], 9200);

	test('is the lowest, and says whose it is', () => {
		expect(limitInForce(build, undefined, undefined)).toEqual({rpm: 9200, from: 'engine'});
		expect(limitInForce(build, rules(8600), rules(8900))).toEqual({rpm: 8600, from: 'rules'});
		expect(limitInForce(build, rules(9000), rules(8900))).toEqual({rpm: 8900, from: 'track'});
		expect(limitInForce(build, rules(9300), rules(9400))).toEqual({rpm: 9200, from: 'engine'});
		expect(limitInForce(build, rules(undefined), rules(8900))).toEqual({rpm: 8900, from: 'track'});
	});

	test('among equals is the one that lies nearest to the engine', () => {
		expect(limitInForce(build, rules(9200), rules(9200)).from).toBe('engine');
		expect(limitInForce(build, rules(9000), rules(9000)).from).toBe('rules');
	});
});
