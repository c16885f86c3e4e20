/**
 * Solves the symmetric positive definite system a·x = b of `n` unknowns in place (Cholesky): `a` holds the matrix by
 * rows and is used up, `b` becomes x. False where the matrix is singular to rounding.
 */
export function solveInPlace(a: Float64Array, b: Float64Array, n: number): boolean {
  for (let j = 0; j < n; j++) {
    const size = a[j * n + j]
    let diagonal = size
    for (let k = 0; k < j; k++) diagonal -= a[j * n + k] * a[j * n + k]
    if (!(diagonal > 1e-12 * size)) return false
    const root = Math.sqrt(diagonal)
    a[j * n + j] = root
    for (let i = j + 1; i < n; i++) {
      let value = a[i * n + j]
      for (let k = 0; k < j; k++) value -= a[i * n + k] * a[j * n + k]
      a[i * n + j] = value / root
    }
  }
  for (let i = 0; i < n; i++) {
    for (let k = 0; k < i; k++) b[i] -= a[i * n + k] * b[k]
    b[i] /= a[i * n + i]
  }
  for (let i = n - 1; i >= 0; i--) {
    for (let k = i + 1; k < n; k++) b[i] -= a[k * n + i] * b[k]
    b[i] /= a[i * n + i]
  }
  return true
}
