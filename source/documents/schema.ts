/** JSON Schemas (draft 2020-12) of the documents, from what reads them. */
import * as z from 'zod/mini';
import {carFields} from './car-fields.ts';
import {trackFields} from './track-fields.ts';

export function trackSchema(): Record<string, unknown> {
	return schemaOf(trackFields(), 'Droprack track');
}

export function carSchema(): Record<string, unknown> {
	return schemaOf(carFields(), 'Droprack car');
}

function schemaOf(fields: z.core.$ZodType, title: string): Record<string, unknown> {
	const {$schema, ...rest} = z.toJSONSchema(fields, {io: 'input', target: 'draft-2020-12'});
	return {$schema, title, ...rest};
}
