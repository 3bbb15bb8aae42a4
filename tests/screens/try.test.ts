import {test} from 'vitest';
import {trackSchema, carSchema} from '/work/wt-screen/source/documents/schema.ts';
test('x', () => {
	const t = trackSchema() as any;
	const t0 = performance.now(); trackSchema(); carSchema(); console.log(performance.now() - t0);
	console.log(JSON.stringify({...t, properties: {...t.properties, situations: undefined}}, null, 1).slice(0, 7000));
	console.log(JSON.stringify(t.properties.situations.items.properties.grip), JSON.stringify(t.properties.situations.items.properties.exit), t.$defs);
	const c = carSchema() as any;
	console.log(JSON.stringify(c.properties.rack), JSON.stringify(c.properties.engines.items.properties.for), JSON.stringify(c.properties.engines.items.required), JSON.stringify(c.properties.margins.properties.level), JSON.stringify(c.properties.installed));
});
