/** A symmetric matrix as its rows; only the lower triangle, the diagonal included, is read. */
export type Symmetric = Float64Array[];

/** A square matrix of zeros. */
export function zeroMatrix(size: number): Symmetric {
  return Array.from({ length: size }, () => new Float64Array(size));
}

/**
 * The lower triangle L with L Lᵀ = the matrix (Golub and Van Loan, Matrix Computations, 4.2.3). Throws RangeError
 * when the matrix is not positive definite.
 */
export function factorise(matrix: Symmetric): Symmetric {
  const factor = zeroMatrix(matrix.length);
  for (let row = 0; row < matrix.length; row += 1) {
    const own = factor[row]!;
    for (let column = 0; column <= row; column += 1) {
      const other = factor[column]!;
      let rest = matrix[row]![column]!;
      for (let k = 0; k < column; k += 1) rest -= own[k]! * other[k]!;
      if (column < row) own[column] = rest / other[column]!;
      else if (rest > 0) own[row] = Math.sqrt(rest);
      else throw new RangeError('the matrix is not positive definite');
    }
  }
  return factor;
}

/** The y of L y = b. Its squares add up to bᵀ A⁻¹ b for the matrix A = L Lᵀ. */
export function solveLower(factor: Symmetric, b: ArrayLike<number>): Float64Array {
  const y = Float64Array.from(b);
  for (let row = 0; row < y.length; row += 1) {
    const own = factor[row]!;
    let rest = y[row]!;
    for (let k = 0; k < row; k += 1) rest -= own[k]! * y[k]!;
    y[row] = rest / own[row]!;
  }
  return y;
}

/** The x of A x = b, where A = L Lᵀ. */
export function solveWith(factor: Symmetric, b: ArrayLike<number>): Float64Array {
  const x = solveLower(factor, b);
  for (let row = x.length - 1; row >= 0; row -= 1) {
    let rest = x[row]!;
    for (let k = row + 1; k < x.length; k += 1) rest -= factor[k]![row]! * x[k]!;
    x[row] = rest / factor[row]![row]!;
  }
  return x;
}
