import envPaths from 'env-paths';
import {expect, test} from 'vitest';
import {homeDirectory} from '../../source/store/home.ts';

test('DROPRACK_HOME is taken as it is', () => {
	expect(homeDirectory({DROPRACK_HOME: '/somewhere', XDG_CONFIG_HOME: '/x'})).toBe('/somewhere');
});

test('without it the place is the one that env-paths gives', () => {
	expect(homeDirectory(process.env)).toBe(envPaths('droprack', {suffix: ''}).config);
});

test('every system has its own place', () => {
	expect(homeDirectory({}, 'linux', '/home/a')).toBe('/home/a/.config/droprack');
	expect(homeDirectory({XDG_CONFIG_HOME: '/x'}, 'linux', '/home/a')).toBe('/x/droprack');
	expect(homeDirectory({}, 'darwin', '/Users/a')).toBe('/Users/a/Library/Preferences/droprack');
	expect(homeDirectory({APPDATA: '/roaming'}, 'win32', '/a')).toBe('/roaming/droprack/Config');
});
