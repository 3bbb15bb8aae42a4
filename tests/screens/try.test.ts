import {test} from 'vitest';
import {drawChart} from '/work/wt-screen/source/screens/parts/chart.ts';
import {painted} from '/work/wt-screen/source/screens/parts/theme.ts';
test('x', () => {
	const line = (k: number) => Array.from({length: 60}, (_, i) => [20 + i * 3, k * (20 + i * 3)] as const).filter(p => p[1] < 9200);
	for (const ascii of [false, true]) {
		const out = drawChart({x: {name: 'mph'}, y: {name: 'rpm'}, series: [2,3,4].map(g => ({name: String(g), mark: String(g), tone: 'first' as const, points: line(200 / g + 25)})), levels: [{y: 8900, name: 'limit 8900'}, {y: 6500, name: 'band 6500'}], signs: [{x: 88, y: 7200, text: 'E', tone: 'strong'}]}, {width: 78, height: 18, ascii});
		console.log(out.map(l => painted(l, {color: false, ascii})).join('\n'));
	}
});
