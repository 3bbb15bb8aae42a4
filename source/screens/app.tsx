/** The screen as Ink draws it. It lays out and calculates nothing: the lines come from `views/frame.ts`. */
import {Box, Text, useStdout} from 'ink';
import {memo, useEffect, useMemo, useRef, useState, useSyncExternalStore} from 'react';
import {LineTable} from './parts/line-table.tsx';
import type {Pieces} from './parts/pieces.ts';
import {painted, type Theme} from './parts/theme.ts';
import type {LiveSession} from './session/live.ts';
import {useKeys} from './terminal/use-keys.ts';
import {frameOf} from './views/frame.ts';

/** An empty Text takes no line. */
const Line = memo(({text}: {text: string}) => <Text wrap="truncate">{text === '' ? ' ' : text}</Text>);

const Lines = ({lines, theme}: {lines: readonly Pieces[]; theme: Theme}) => (
	<Box flexDirection="column">
		{lines.map((pieces, y) => (
			// biome-ignore lint/suspicious/noArrayIndexKey: a line is what stands at its place.
			<Line key={y} text={painted(pieces, theme)} />
		))}
	</Box>
);

type Dimensions = {readonly width: number; readonly height: number};

function useSize(): Dimensions {
	const {stdout} = useStdout();
	const measure = (): Dimensions => ({width: stdout.columns ?? 80, height: stdout.rows ?? 24});
	const [size, setSize] = useState(measure);
	useEffect(() => {
		const resized = () => setSize(measure());
		stdout.on('resize', resized);
		return () => {
			stdout.off('resize', resized);
		};
	});
	return size;
}

export function App({live, theme}: {live: LiveSession; theme: Theme}) {
	const state = useSyncExternalStore(live.subscribe, live.state);
	const {width, height} = useSize();
	useKeys(event => live.press(event));
	const start = useRef(0);
	const frame = useMemo(
		() => frameOf(state, {width, height, ascii: theme.ascii}, start.current),
		[state, width, height, theme],
	);
	if (frame.table) start.current = frame.table.start;
	return (
		<Box flexDirection="column" width={width}>
			<Lines lines={frame.top} theme={theme} />
			{frame.table && (
				<Box>
					<LineTable
						data={frame.table.rows}
						columns={frame.table.columns.map(({head}) => head)}
						layout={frame.table.columns}
						selected={frame.table.selected}
						theme={theme}
					/>
					<Lines lines={frame.beside} theme={theme} />
				</Box>
			)}
			<Lines lines={frame.bottom} theme={theme} />
		</Box>
	);
}
