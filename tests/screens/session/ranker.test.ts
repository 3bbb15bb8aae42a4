import {expect, test} from 'vitest';
import {withJson} from '../../../source/screens/session/documents.ts';
import {type Clock, Ranker} from '../../../source/screens/session/ranker.ts';
import {documents, oval} from './documents.ts';

/** A clock that a test turns: each look at it takes so many milliseconds, and what is put off waits to be let go. */
function clock(lookMs: number) {
	let now = 0;
	const waiting: (() => void)[] = [];
	const made: Clock = {
		now: () => {
			now += lookMs;
			return now;
		},
		later: act => {
			waiting.push(act);
			return () => waiting.splice(waiting.indexOf(act), 1);
		},
	};
	const letGo = () => {
		for (const act of waiting.splice(0)) act();
	};
	return {made, waiting, letGo};
}

const inputs = {documents, situation: undefined};

test('at the start there is the pair in the car by itself, and the rest comes later', () => {
	const time = clock(0);
	const ranker = new Ranker(time.made, () => {});
	ranker.start(inputs);
	expect(ranker.answer).toMatchObject({
		is: 'working',
		first: {row: {pair: '36/36', gearbox: 'A', reason: '', gainS: null}},
	});
	time.letGo();
	expect(ranker.answer).toMatchObject({is: 'ready'});
});

test('what fits into a frame is ranked at once', () => {
	const ranker = new Ranker(clock(0).made, () => {});
	ranker.rank(inputs);
	expect(ranker.answer.is).toBe('ready');
});

test('a long rack is ranked in slices, and progress is told', () => {
	const time = clock(30);
	let told = 0;
	const ranker = new Ranker(time.made, () => told++);
	ranker.rank(inputs);
	expect(ranker.answer).toMatchObject({is: 'working', progress: {done: 4, total: 10}});
	for (let i = 0; i < 50; i++) time.letGo();
	expect(ranker.answer.is).toBe('ready');
	expect(told).toBeGreaterThan(0);
});

test('it can be stopped, and then does nothing more', () => {
	const time = clock(30);
	const ranker = new Ranker(time.made, () => {});
	ranker.rank(inputs);
	expect(ranker.stop()).toBe(true);
	expect(time.waiting).toEqual([]);
	expect(ranker.answer).toMatchObject({is: 'stopped', progress: {done: 4, total: 10}});
	expect(ranker.stop()).toBe(false);
});

test('a new question leaves the old one', () => {
	const time = clock(30);
	const ranker = new Ranker(time.made, () => {});
	ranker.rank(inputs);
	ranker.rank({...inputs, situation: 'In the tow'});
	expect(time.waiting).toHaveLength(1);
	for (let i = 0; i < 50; i++) time.letGo();
	expect(ranker.answer).toMatchObject({
		is: 'ready',
		ranked: {
			ranking: {
				rows: expect.arrayContaining([
					expect.objectContaining({situations: [expect.objectContaining({name: 'In the tow'})]}),
				]),
			},
		},
	});
});

test('while the same documents are ranked anew the last ranking is still there; that of others is not', () => {
	const time = clock(0);
	const ranker = new Ranker(time.made, () => {});
	ranker.rank(inputs);
	ranker.start({documents: withJson(documents, 'track', {...oval.json, lap: '0.7 mi'}), situation: undefined});
	expect(ranker.answer).toMatchObject({is: 'working', before: {ranking: expect.anything()}, first: undefined});
	const elsewhere = {...oval, id: 'track:elsewhere'};
	ranker.start({
		documents: {...documents, open: {...documents.open, [elsewhere.id]: elsewhere}, track: elsewhere.id},
		situation: undefined,
	});
	expect(ranker.answer).toMatchObject({is: 'working', before: undefined, first: expect.anything()});
});

test('documents that do not read, and faults that only car and track together show, are told with their place', () => {
	const ranker = new Ranker(clock(0).made, () => {});
	ranker.rank({...inputs, documents: withJson(documents, 'track', {...oval.json, lap: '7'})});
	expect(ranker.answer).toMatchObject({is: 'faulty', wrong: [{where: 'track', path: 'lap'}]});
	ranker.rank({...inputs, documents: withJson(documents, 'track', {...oval.json, type: 'superspeedway'})});
	expect(ranker.answer).toMatchObject({is: 'faulty', wrong: [{where: 'car', path: 'engines'}]});
});
