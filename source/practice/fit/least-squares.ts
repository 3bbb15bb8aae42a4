/** Linear least squares by Householder QR (Golub, 1965): the normal equations would square the condition of the columns. */
import {Matrix, QrDecomposition} from 'ml-matrix';

/** Columns of the model, each as long as the readings. */
export type Columns = readonly Float64Array[];

export type LeastSquares = {
	/** One a column. */
	readonly coefficients: Float64Array;
	readonly residuals: Float64Array;
	/** (XᵀWX)⁻¹, row by row: p·p entries. */
	readonly inverse: Float64Array;
};

/**
 * Least squares of y on the columns, with weights where given. Undefined where the columns do not determine the coefficients:
 * fewer readings than columns, or one column that the others make up to within rounding.
 */
export function leastSquares(columns: Columns, y: Float64Array, weights?: Float64Array): LeastSquares | undefined {
	const [n, p] = [y.length, columns.length];
	if (n < p) return undefined;
	// Columns of one length each: what is left of one that the others make up can then be told from rounding.
	const roots = weights?.map(Math.sqrt);
	const lengths = columns.map(column => Math.sqrt(column.reduce((sum, x, i) => sum + x * x * (weights?.[i] ?? 1), 0)));
	if (lengths.some(length => !(length > 0))) return undefined;
	const scaled = Matrix.zeros(n, p);
	const right = Matrix.zeros(n, 1);
	for (let i = 0; i < n; i++) {
		const root = roots?.[i] ?? 1;
		for (let j = 0; j < p; j++) scaled.set(i, j, (root * columns[j]![i]!) / lengths[j]!);
		right.set(i, 0, root * y[i]!);
	}
	const qr = new QrDecomposition(scaled);
	const r = qr.upperTriangularMatrix;
	for (let j = 0; j < p; j++) if (Math.abs(r.get(j, j)) < n * Number.EPSILON) return undefined;

	const solved = qr.solve(right);
	const coefficients = Float64Array.from(lengths, (length, j) => solved.get(j, 0) / length);
	return {coefficients, residuals: residualsOf(columns, y, coefficients), inverse: inverseOf(r, lengths)};
}

export function residualsOf(columns: Columns, y: Float64Array, coefficients: ArrayLike<number>): Float64Array {
	return y.map((value, i) => columns.reduce((left, column, j) => left - column[i]! * coefficients[j]!, value));
}

/**
 * Standard error of each coefficient by the textbook formula: s²·(XᵀX)⁻¹ with s² = Σr²/(n − p). It holds where the readings
 * err independently and alike. NaN with no reading to spare.
 */
export function standardErrors({residuals, inverse, coefficients}: LeastSquares): Float64Array {
	const p = coefficients.length;
	const s = residualSd(residuals, p);
	return coefficients.map((_, j) => s * Math.sqrt(inverse[j * p + j]!));
}

export function residualSd(residuals: Float64Array, p: number): number {
	return Math.sqrt(residuals.reduce((sum, r) => sum + r * r, 0) / (residuals.length - p));
}

/** (RᵀR)⁻¹ with the columns' lengths taken back out, R upper triangular. */
function inverseOf(r: Matrix, lengths: readonly number[]): Float64Array {
	const p = lengths.length;
	const inverted = Matrix.zeros(p, p);
	for (let column = 0; column < p; column++) {
		for (let row = column; row >= 0; row--) {
			let left = row === column ? 1 : 0;
			for (let k = row + 1; k <= column; k++) left -= r.get(row, k) * inverted.get(k, column);
			inverted.set(row, column, left / r.get(row, row));
		}
	}
	const product = inverted.mmul(inverted.transpose());
	return Float64Array.from({length: p * p}, (_, at) => {
		const [row, column] = [Math.floor(at / p), at % p];
		return product.get(row, column) / (lengths[row]! * lengths[column]!);
	});
}
