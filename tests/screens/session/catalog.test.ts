import {expect, test} from 'vitest';
import {choicesFor} from '../../../source/screens/session/catalog.ts';
import {withJson} from '../../../source/screens/session/documents.ts';
import {catalog, documents} from './documents.ts';

const titles = (typed: string, from = documents) => choicesFor(catalog, from, 'track', typed).map(({title}) => title);

test('without anything typed there is everything of the kind', () => {
	expect(titles('')).toEqual(['Fixture Oval', 'Äußere Bahn']);
	expect(choicesFor(catalog, documents, 'car', '').map(({title}) => title)).toEqual(['Fixture Car']);
});

test('part of a name is enough; case and accents make no difference', () => {
	expect(titles('oval')).toEqual(['Fixture Oval']);
	expect(titles('AU')).toEqual(['Äußere Bahn']);
	expect(titles('ov fix')).toEqual(['Fixture Oval']);
	expect(titles('nowhere')).toEqual([]);
});

test('what starts with what was typed comes first', () => {
	const named = catalog.map(one => (one.id === 'track:other' ? {...one, json: {...one.json, name: 'Oval West'}} : one));
	expect(choicesFor(named, documents, 'track', 'oval').map(({title}) => title)).toEqual(['Oval West', 'Fixture Oval']);
});

test('a document that is open is there with its changes', () => {
	const changed = withJson(documents, 'track', {...documents.open['track:oval']!.json, name: 'Fixture Oval, Friday'});
	expect(choicesFor(catalog, changed, 'track', 'friday')).toMatchObject([{isChanged: true, isCurrent: true}]);
});
