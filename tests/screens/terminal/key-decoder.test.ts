import fc from 'fast-check';
import {expect, test} from 'vitest';
import {KeyDecoder} from '../../../source/screens/terminal/key-decoder.ts';
import {type KeyEvent, keyName} from '../../../source/screens/terminal/key-event.ts';
import {runs} from '../../runs.ts';

const decoded = (...chunks: string[]): KeyEvent[] => {
	const decoder = new KeyDecoder();
	return [...chunks.flatMap(chunk => decoder.push(chunk)), ...decoder.flush()];
};
const names = (...chunks: string[]) => decoded(...chunks).map(keyName);

test('each character is an event of its own, also when several come at once', () => {
	expect(names('jjk')).toEqual(['j', 'j', 'k']);
	expect(names('12\r')).toEqual(['1', '2', 'enter']);
	expect(names('é漢👍')).toEqual(['é', '漢', '👍']);
});

test('control characters are keys with Ctrl', () => {
	expect(names('\x01\x03\x1A\0')).toEqual(['ctrl+a', 'ctrl+c', 'ctrl+z', 'ctrl+space']);
	expect(names('\r\n\t\x7F\b')).toEqual(['enter', 'enter', 'tab', 'backspace', 'backspace']);
});

test('keys are named whichever way the terminal sends them', () => {
	expect(names('\x1B[A', '\x1BOA')).toEqual(['up', 'up']);
	expect(names('\x1B[H', '\x1B[1~', '\x1B[7~')).toEqual(['home', 'home', 'home']);
	expect(names('\x1B[F', '\x1B[4~', '\x1BOF')).toEqual(['end', 'end', 'end']);
	expect(names('\x1B[3~', '\x1B[5~', '\x1B[6~')).toEqual(['delete', 'pageup', 'pagedown']);
	expect(names('\x1BOP', '\x1B[11~', '\x1B[24~')).toEqual(['f1', 'f1', 'f12']);
});

test('modifiers of xterm are told apart', () => {
	expect(names('\x1B[1;5C', '\x1B[1;3D', '\x1B[1;2A', '\x1B[Z')).toEqual([
		'ctrl+right',
		'alt+left',
		'shift+up',
		'shift+tab',
	]);
});

test('Ctrl with F1 to F4 and an answer about the cursor are keys or nothing, and no crash', () => {
	expect(names('\x1B[1;5P', '\x1B[1;5Q', '\x1B[1;5R', '\x1B[1;5S')).toEqual([
		'ctrl+f1',
		'ctrl+f2',
		'ctrl+f3',
		'ctrl+f4',
	]);
	expect(names('\x1B[25;5~')).toEqual([]);
});

test('Esc is a key, alone, twice, and before a letter as Alt', () => {
	expect(names('\x1B')).toEqual(['escape']);
	expect(names('\x1B\x1B')).toEqual(['escape', 'escape']);
	expect(names('\x1Bb')).toEqual(['alt+b']);
	expect(names('\x1B\x7F')).toEqual(['alt+backspace']);
	expect(names('\x1B[')).toEqual(['alt+[']);
});

test('a sequence may arrive in pieces', () => {
	expect(names('\x1B', '[', '1;5', 'C')).toEqual(['ctrl+right']);
	expect(names('\x1B[2', '00~ab', 'c\x1B[20', '1~d')).toEqual([undefined, 'd']);
});

test('what is unknown is dropped as a whole, never typed', () => {
	expect(decoded('\x1B[97;5u')).toEqual([]);
	expect(decoded('\x1B[?1;2c')).toEqual([]);
	expect(decoded('\x1B]11;rgb:0000/0000/0000\x07')).toEqual([]);
	expect(decoded('\x1B]11;rgb:0000/0000/0000\x1B\\')).toEqual([]);
	expect(decoded('\x1BP1+r544e=1\x1B\\')).toEqual([]);
	expect(decoded('\x1B[[A')).toEqual([]);
});

test('an answer of the terminal that is broken off ends there, and what follows is what it is', () => {
	expect(names('\x1BP\x17\\')).toEqual(['\\']);
	expect(names('\x1BP\x17', '\\')).toEqual(['\\']);
	expect(names('\x1B]11;rgb\x1B[A')).toEqual(['up']);
	expect(names('\x1B]11;rgb\x1B', '[A')).toEqual(['up']);
});

test('the mouse is passed over, in both of its ways of speaking', () => {
	expect(decoded('\x1B[<0;10;5M\x1B[<0;10;5m')).toEqual([]);
	expect(decoded('\x1B[M !"')).toEqual([]);
	expect(names('\x1B[M', ' !"x')).toEqual(['x']);
});

test('a paste is one event, with everything in it', () => {
	const text = 'rpm,torque\r\n4000,405\x1B[31m\x03q';
	expect(decoded(`\x1B[200~${text}\x1B[201~`)).toEqual([{kind: 'paste', text}]);
});

test('an open paste waits for its end; when nothing more comes it is over', () => {
	const decoder = new KeyDecoder();
	expect(decoder.push('\x1B[200~half')).toEqual([]);
	expect(decoder.pending).toBe('paste');
	expect(decoder.flush()).toEqual([{kind: 'paste', text: 'half'}]);
	expect(decoder.pending).toBeUndefined();
});

const pieces = fc.constantFrom(
	'\x1B',
	'[',
	'O',
	']',
	'P',
	'<',
	'M',
	'200~',
	'201~',
	'1;5',
	'A',
	'R',
	'~',
	'é',
	'q',
	'\x03',
	'\x07',
	'\\',
	' ',
	'漢',
);

test('any bytes, cut anywhere, end in events and leave nothing open', () => {
	fc.assert(
		fc.property(fc.array(fc.array(pieces).map(parts => parts.join(''))), chunks => {
			const decoder = new KeyDecoder();
			for (const chunk of chunks) decoder.push(chunk);
			decoder.flush();
			decoder.flush();
			expect(decoder.pending).toBeUndefined();
			expect(names(...chunks).every(name => name === undefined || !name.includes('\x1B'))).toBe(true);
		}),
		{numRuns: runs(300, 20_000)},
	);
});
