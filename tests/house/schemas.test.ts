import {expect, test} from 'vitest';
import {carSchema, trackSchema} from '../../source/documents/schema.ts';

/** Shipped as files so that an editor completes a document that says `"$schema": "schemas/track.json"`. */
test.each([
	['track', trackSchema()],
	['car', carSchema()],
])('the shipped JSON Schema of a %s is what reads one; else: npm run schemas', async (kind, schema) => {
	await expect(`${JSON.stringify(schema, null, '\t')}\n`).toMatchFileSnapshot(`../../tracks/schemas/${kind}.json`);
});
