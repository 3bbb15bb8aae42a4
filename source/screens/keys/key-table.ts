/** Every key once: handling, the line of keys, the help and the table in the README are made from this. */

import {aheadKeys} from './ahead-keys.ts';
import type {AnyBinding} from './binding.ts';
import {everywhereKeys} from './everywhere-keys.ts';
import {formKeys} from './form-keys.ts';
import {keepingKeys} from './keeping-keys.ts';
import {lifeKeys} from './life-keys.ts';
import {lookingKeys} from './looking-keys.ts';
import {oddsKeys} from './odds-keys.ts';
import {practiceKeys} from './practice-keys.ts';
import type {Scope} from './scopes.ts';
import {sessionKeys} from './session-keys.ts';
import {sharingKeys} from './sharing-keys.ts';

export const bindings = [
	...lookingKeys,
	...lifeKeys,
	...oddsKeys,
	...formKeys,
	...sharingKeys,
	...keepingKeys,
	...practiceKeys,
	...aheadKeys,
	...sessionKeys,
	...everywhereKeys,
] as const;

export type ActionName = (typeof bindings)[number]['does'];
export type Binding = AnyBinding & {readonly does: ActionName};

/** These work also while something is typed or asked. */
const always: readonly ActionName[] = ['leave', 'suspend', 'redraw'];

const table: readonly Binding[] = bindings;

/** What a key does where these scopes hold, the first one first; undefined where it does nothing. */
export function actionFor(key: string, held: readonly Scope[]): ActionName | undefined {
	const found = held
		.map(scope => table.find(binding => binding.scope === scope && binding.keys.includes(key)))
		.find(binding => binding !== undefined);
	if (found) return found.does;
	return table.find(({scope, keys, does}) => scope === 'everywhere' && keys.includes(key) && always.includes(does))
		?.does;
}

/** The bindings that work where these scopes hold, each without the keys that an earlier scope takes from it. */
export function workingIn(held: readonly Scope[]): Binding[] {
	const taken = new Set<string>();
	return held.flatMap(scope => {
		const working = bindingsOf(scope)
			.map(binding => ({...binding, keys: binding.keys.filter(key => !taken.has(key))}))
			.filter(({keys}) => keys.length > 0);
		for (const {keys} of bindingsOf(scope)) for (const key of keys) taken.add(key);
		return working;
	});
}

/** The bindings of a scope, in the order of the table. */
export const bindingsOf = (scope: Scope): readonly Binding[] => table.filter(binding => binding.scope === scope);
