/** A generated log as the text of a file. */
import type {LoggedRun} from '../../source/logs/logged-run.ts';

const mphMps = 0.44704;

/** Header, units and rows in mph, rpm and per cent; what is lost is an empty cell. */
export function csvOf(run: LoggedRun): string {
	const cells = (i: number) => [
		run.timeS[i]!.toFixed(2),
		(run.speedMps[i]! / mphMps).toFixed(2),
		run.rpm[i]!.toFixed(0),
		((run.throttle?.[i] ?? Number.NaN) * 100).toFixed(1),
		String(run.lap?.[i] ?? ''),
	];
	const rows = Array.from({length: run.samples}, (_, i) => cells(i).join(',').replaceAll('NaN', ''));
	return ['Time,Speed,Engine RPM,Throttle,Lap', 's,mph,rpm,%,', ...rows, ''].join('\n');
}
