/** What is typed into a field of the form, whatever the field takes. */

import {dimensions} from '../../../source/documents/units.ts';
import {edited, editLine} from '../../../source/screens/parts/edit-line.ts';
import type {FieldKind} from '../../../source/screens/session/field-kind.ts';
import {understand, valueText} from '../../../source/screens/session/understand.ts';
import type {Answer, Reader} from '../reader.ts';
import {quantities} from './quantities.ts';

const kinds: readonly FieldKind[] = [
	// A bare number has a kind of its own.
	...dimensions
		.filter(dimension => dimension !== 'number')
		.map(dimension => ({is: 'quantity', dimensions: [dimension], change: false}) as const),
	{is: 'quantity', dimensions: ['speed', 'share'], change: true},
	{is: 'number'},
	{is: 'text'},
	{is: 'choice', among: ['short', 'intermediate', 'superspeedway', 'road']},
	{is: 'flag'},
	{is: 'list', of: {is: 'number'}},
	{is: 'list', of: {is: 'text'}},
];
const before = ['88 mph', undefined, 1, [1, 2]] as const;

function read(pasted: string): Answer {
	const {text} = edited(editLine(''), {kind: 'paste', text: pasted})!;
	const answers = kinds.flatMap(kind =>
		before.map(value => ({kind, value, understood: understand(text, kind, value, 'us')})),
	);
	const taken = answers.filter(({understood}) => understood.ok);
	const unstable = taken.find(({kind, value, understood}) => {
		const again = understood.ok ? understand(valueText(understood.value), kind, value, 'us') : understood;
		// A text may hold what parts entries of a list.
		return kind.is !== 'list' && !(again.ok && understood.ok && again.value === understood.value);
	});
	return {
		accepted: taken.length > 0,
		said: answers.map(({understood}) => understood.words).join('\n'),
		broken: unstable && `shown and typed again it is the same: ${JSON.stringify(unstable)}`,
	};
}

export const fields: Reader = {
	name: 'fields',
	examples: async () => [...(await quantities.examples()), 'yes', 'no', 'inter', '1, 2; 3', 'Back stretch', '33/38'],
	words: quantities.words,
	longest: 400,
	work: {start: 200_000, perCharacter: 6000},
	read,
};
