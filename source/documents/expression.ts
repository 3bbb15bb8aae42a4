/**
 * Arithmetic with units, by recursive descent: numbers, + − × ÷, parentheses, units; nothing else. A unit at the end
 * belongs to the whole expression if no other unit stands in it; otherwise every term that needs one has its own.
 */
import type {Stop, Token} from './tokens.ts';
import type {Unit} from './units.ts';

/** `hasUnit`: the value is SI; otherwise it is a plain number. */
type Value = {readonly value: number; readonly hasUnit: boolean};
export type Evaluated = {ok: true; value: number; hasUnit: boolean} | {ok: false; stop: Stop};

/** Carries what is wrong out of the recursion; caught in `evaluate`, never seen outside. */
class Stopped {
	readonly stop: Stop;
	constructor(stop: Stop) {
		this.stop = stop;
	}
}

/** The value of the tokens. `units` holds what the unit names in them mean; all of one dimension. */
export function evaluate(tokens: readonly Token[], units: ReadonlyMap<string, Unit>): Evaluated {
	const last = tokens.at(-1);
	const unitCount = tokens.filter(({kind}) => kind === 'unit').length;
	const common = last?.kind === 'unit' && unitCount === 1 ? units.get(last.name)! : undefined;
	try {
		const reader = new Reader(common ? tokens.slice(0, -1) : tokens, units);
		const result = reader.whole();
		const value = common ? inSi(result.value, common) : result.value;
		if (!Number.isFinite(value)) throw new Stopped({found: 'a result that is too large'});
		return {ok: true, value, hasUnit: common !== undefined || result.hasUnit};
	} catch (error) {
		if (error instanceof Stopped) return {ok: false, stop: error.stop};
		throw error;
	}
}

export function inSi(value: number, {factor, zero}: Unit): number {
	return (value - zero) * factor;
}

/** Recursion is bounded by the number of tokens, which the length of the text bounds. */
class Reader {
	readonly #tokens: readonly Token[];
	readonly #units: ReadonlyMap<string, Unit>;
	#at = 0;

	constructor(tokens: readonly Token[], units: ReadonlyMap<string, Unit>) {
		this.#tokens = tokens;
		this.#units = units;
	}

	whole(): Value {
		const value = this.#sum();
		if (this.#at < this.#tokens.length) throw new Stopped(this.#unexpected());
		return value;
	}

	#sum(): Value {
		let left = this.#product();
		for (;;) {
			const sign = this.#take('+') ? 1 : this.#take('-') ? -1 : 0;
			if (sign === 0) return left;
			const right = this.#product();
			if (left.hasUnit !== right.hasUnit) throw new Stopped({found: 'a term without a unit beside one with a unit'});
			left = {value: left.value + sign * right.value, hasUnit: left.hasUnit};
		}
	}

	#product(): Value {
		let left = this.#signed();
		for (;;) {
			if (this.#take('*')) left = times(left, this.#signed());
			else if (this.#take('/')) left = over(left, this.#signed());
			else return left;
		}
	}

	#signed(): Value {
		if (this.#take('+')) return this.#signed();
		if (!this.#take('-')) return this.#withUnit(this.#atom());
		const {value, hasUnit} = this.#signed();
		return {value: -value, hasUnit};
	}

	#atom(): Value {
		if (this.#take('(')) {
			const inner = this.#sum();
			if (!this.#take(')'))
				throw new Stopped(this.#at < this.#tokens.length ? this.#unexpected() : {found: 'a "(" that is not closed'});
			return inner;
		}
		const token = this.#tokens[this.#at];
		if (token?.kind !== 'number') throw new Stopped(this.#unexpected());
		this.#at++;
		return {value: token.value, hasUnit: false};
	}

	#withUnit(value: Value): Value {
		const token = this.#tokens[this.#at];
		if (token?.kind !== 'unit') return value;
		if (value.hasUnit) throw new Stopped({found: `a second unit "${token.name}"`});
		this.#at++;
		return {value: inSi(value.value, this.#units.get(token.name)!), hasUnit: true};
	}

	#take(operator: string): boolean {
		const token = this.#tokens[this.#at];
		if (token?.kind !== 'operator' || token.operator !== operator) return false;
		this.#at++;
		return true;
	}

	#unexpected(): Stop {
		const token = this.#tokens[this.#at];
		if (token === undefined) return {found: 'no number at the end'};
		if (token.kind === 'operator') return {found: `"${token.operator}" where none can stand`};
		if (token.kind === 'unit') return {found: `"${token.name}" without a number before it`};
		const before = this.#tokens[this.#at - 1];
		if (before?.kind !== 'number') return {found: `"${token.text}" without an operator before it`};
		return {found: `"${before.text} ${token.text}"`, hint: 'Write a fraction with a plus sign, like 86+1/2.'};
	}
}

function times(left: Value, right: Value): Value {
	if (left.hasUnit && right.hasUnit) throw new Stopped({found: 'a product of two values with units'});
	return {value: left.value * right.value, hasUnit: left.hasUnit || right.hasUnit};
}

function over(left: Value, right: Value): Value {
	if (right.hasUnit)
		throw new Stopped({
			found: 'a division by a value with a unit',
			hint: 'Put a fraction in parentheses, like (1/2) mi.',
		});
	if (right.value === 0) throw new Stopped({found: 'a division by zero'});
	return {value: left.value / right.value, hasUnit: left.hasUnit};
}
