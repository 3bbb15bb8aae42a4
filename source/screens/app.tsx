/** The screen as Ink draws it. It lays out and calculates nothing: the lines come from `views/frame.ts`. */
import {Box, Text} from 'ink';
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

const numbers = (count: number) => Array.from({length: count}, (_, row) => ({row}));

/** Something of a size that may change, and tells. */
export type Sized = {
	readonly size: {readonly width: number; readonly height: number};
	on(event: 'resize', told: () => void): unknown;
	off(event: 'resize', told: () => void): unknown;
};

function useSize(sized: Sized): Sized['size'] {
	const [size, setSize] = useState(sized.size);
	useEffect(() => {
		const resized = () => setSize(sized.size);
		sized.on('resize', resized);
		return () => {
			sized.off('resize', resized);
		};
	}, [sized]);
	return size;
}

export function App({live, theme, screen}: {live: LiveSession; theme: Theme; screen: Sized}) {
	const state = useSyncExternalStore(live.subscribe, live.state);
	const {width, height} = useSize(screen);
	useKeys(event => live.press(event));
	const start = useRef(0);
	const frame = useMemo(
		() => frameOf(state, {width, height, ascii: theme.ascii}, start.current),
		[state, width, height, theme],
	);
	if (frame.table) start.current = frame.table.start;
	return (
		<Box flexDirection="column" width={width} flexShrink={0}>
			<Lines lines={frame.top} theme={theme} />
			{frame.table && (
				<Box>
					<LineTable
						data={numbers(frame.table.rows.length)}
						columns={[]}
						rows={frame.table.rows}
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
