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

/** Of the terminal; Ink itself only follows its width. */
function useTerminalSize(): Dimensions {
	const {stdout} = useStdout();
	const [size, setSize] = useState(() => ({width: stdout.columns, height: stdout.rows}));
	useEffect(() => {
		const resized = () => setSize({width: stdout.columns, height: stdout.rows});
		stdout.on('resize', resized);
		return () => {
			stdout.off('resize', resized);
		};
	}, [stdout]);
	return size;
}

type Given = {
	readonly live: LiveSession;
	readonly theme: Theme;
	/** The terminal's unless given. */
	readonly size?: Dimensions;
};

export function App({live, theme, size}: Given) {
	const state = useSyncExternalStore(live.subscribe, live.state);
	const terminal = useTerminalSize();
	const {width, height} = size ?? terminal;
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
