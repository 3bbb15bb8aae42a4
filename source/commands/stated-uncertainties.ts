/** How well the documents say their numbers are known, in the form that odds take. */
import type {Stated} from '../odds/stated.ts';
import type {Loaded} from './load-documents.ts';

export const statedIn = ({documents, uncertainties}: Pick<Loaded, 'documents' | 'uncertainties'>): Stated => ({
	...uncertainties,
	situations: situationNames(documents.track),
});

/** In the order of the document, which the paths of its fields count by. */
export const situationNames = ({situations}: Record<string, unknown>): string[] =>
	Array.isArray(situations) ? situations.map(situation => String((situation as {name?: unknown}).name)) : [];
