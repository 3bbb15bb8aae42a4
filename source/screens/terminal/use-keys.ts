/** Keys for a component: through our own decoder, as Ink's ends the program on sequences that it does not know. */
import {useStdin} from 'ink';
import {useEffect, useRef} from 'react';
import {KeyDecoder} from './key-decoder.ts';
import type {KeyEvent} from './key-event.ts';

/** A sequence arrives as a whole or within this time; a paste may come in pieces over a slow line. */
const quietMs = {sequence: 30, paste: 1000} as const;

export function useKeys(handle: (event: KeyEvent) => void): void {
	const {stdin, setRawMode, isRawModeSupported} = useStdin();
	const latest = useRef(handle);
	latest.current = handle;
	useEffect(() => {
		if (!isRawModeSupported) return undefined;
		const decoder = new KeyDecoder();
		let timer: NodeJS.Timeout | undefined;
		const send = (events: readonly KeyEvent[]) => {
			for (const event of events) latest.current(event);
		};
		const read = (data: string | Uint8Array) => {
			clearTimeout(timer);
			send(decoder.push(String(data)));
			if (decoder.pending) timer = setTimeout(() => send(decoder.flush()), quietMs[decoder.pending]);
		};
		setRawMode(true);
		stdin.on('data', read);
		return () => {
			clearTimeout(timer);
			stdin.off('data', read);
			setRawMode(false);
		};
	}, [stdin, setRawMode, isRawModeSupported]);
}
