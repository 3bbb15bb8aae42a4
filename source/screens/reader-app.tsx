/** The screen for someone who has it read aloud: the same lines one below the other, without what is only drawn. */
import {Box, Text} from 'ink';
import {useSyncExternalStore} from 'react';
import {painted} from './parts/theme.ts';
import type {LiveSession} from './session/live.ts';
import {useKeys} from './terminal/use-keys.ts';
import {spokenLines} from './views/spoken.ts';

const spoken = {color: false, ascii: true} as const;

export function ReaderApp({live}: {live: LiveSession}) {
	const state = useSyncExternalStore(live.subscribe, live.state);
	useKeys(event => live.press(event));
	return (
		<Box flexDirection="column">
			{spokenLines(state).map((pieces, y) => (
				// biome-ignore lint/suspicious/noArrayIndexKey: a line is what stands at its place.
				<Text key={y}>{painted(pieces, spoken)}</Text>
			))}
		</Box>
	);
}
