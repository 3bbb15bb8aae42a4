import {describe, expect, test} from 'vitest';
import {gaussLegendre} from '../../source/drivetrain/gauss-legendre.ts';

const orders = [1, 2, 3, 4, 5, 6, 8, 10, 16, 24, 32, 64];

describe.each(orders)('of order %i', order => {
	const {nodes, weights} = gaussLegendre(order);

	test('integrates every power up to 2n − 1, and misses the next even one', () => {
		for (let power = 0; power < 2 * order; power++) {
			const exact = power % 2 === 0 ? 2 / (power + 1) : 0;
			expect(Math.abs(sum(power) - exact)).toBeLessThan(5e-15);
		}
		if (order <= 16) expect(Math.abs(sum(2 * order) - 2 / (2 * order + 1))).toBeGreaterThan(1e-11);
	});

	test('has rising nodes inside the interval, symmetric, and positive weights', () => {
		for (let i = 0; i < order; i++) {
			expect(nodes[i]).toBeGreaterThan(nodes[i - 1] ?? -1);
			expect(nodes[i]! + nodes[order - 1 - i]!).toBe(0);
			expect(weights[i]).toBeGreaterThan(0);
			expect(weights[i]).toBe(weights[order - 1 - i]);
		}
		expect(nodes[order - 1]).toBeLessThan(1);
	});

	function sum(power: number): number {
		return nodes.reduce((total, node, i) => total + weights[i]! * node ** power, 0);
	}
});

// Closed forms (Abramowitz & Stegun, table 25.4, gives the same to 15 digits).
test('has the closed values of orders 2 to 5', () => {
	const closed: readonly [order: number, node: number, weight: number][] = [
		[2, 1 / Math.sqrt(3), 1],
		[3, Math.sqrt(3 / 5), 5 / 9],
		[4, Math.sqrt(3 / 7 + (2 / 7) * Math.sqrt(6 / 5)), (18 - Math.sqrt(30)) / 36],
		[5, Math.sqrt(5 + 2 * Math.sqrt(10 / 7)) / 3, (322 - 13 * Math.sqrt(70)) / 900],
	];
	for (const [order, node, weight] of closed) {
		const rule = gaussLegendre(order);
		expect(rule.nodes[order - 1]).toBeCloseTo(node, 15);
		expect(rule.weights[order - 1]).toBeCloseTo(weight, 14);
	}
	expect(gaussLegendre(3).weights[1]).toBeCloseTo(8 / 9, 15);
	expect(gaussLegendre(5).weights[2]).toBeCloseTo(128 / 225, 15);
});

// Closed form: the integral of e^x over [−1, 1] is e − 1/e.
test('eight points give the integral of e^x in all digits', () => {
	const {nodes, weights} = gaussLegendre(8);
	const value = nodes.reduce((total, node, i) => total + weights[i]! * Math.exp(node), 0);
	expect(value).toBeCloseTo(Math.E - 1 / Math.E, 14);
});
