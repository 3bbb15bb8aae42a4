/** Where droprack keeps what is its own, without loading a library to know it. */
import {homedir} from 'node:os';
import {join} from 'node:path';

type Environment = Readonly<Record<string, string | undefined>>;

/**
 * The directory of preferences: DROPRACK_HOME, else what env-paths gives as the place of settings
 * for the name `droprack` without a suffix.
 */
export const homeDirectory = (
	environment: Environment,
	platform: NodeJS.Platform = process.platform,
	userHome: string = homedir(),
): string => {
	if (environment.DROPRACK_HOME) return environment.DROPRACK_HOME;
	if (platform === 'darwin') return join(userHome, 'Library', 'Preferences', 'droprack');
	if (platform === 'win32')
		return join(environment.APPDATA || join(userHome, 'AppData', 'Roaming'), 'droprack', 'Config');
	return join(environment.XDG_CONFIG_HOME || join(userHome, '.config'), 'droprack');
};
