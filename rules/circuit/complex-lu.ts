/** A complex column or a square matrix in rows, real and imaginary parts apart: plain arrays are what is quick. */
export type ComplexArray = { re: Float64Array; im: Float64Array }

export const zeros = (length: number): ComplexArray => ({
  re: new Float64Array(length),
  im: new Float64Array(length),
})

/** A diagonal entry this part of the largest in its column stays the pivot: changing rows would fill the matrix. */
const goodEnough = 0.1

/**
 * Factors a square complex matrix, in place, into a lower and an upper triangle.
 *
 * Gaussian elimination with partial pivoting (Golub and Van Loan, "Matrix Computations", section 3.4), in which the
 * diagonal keeps its place while it is large enough. Zeros are passed over: a wiring has few branches at a node.
 * @param a n × n entries in rows; holds the two triangles afterwards. Must not be singular.
 * @returns what solves for a right-hand side, in place, as often as wanted
 */
export function factorMatrix(n: number, { re, im }: ComplexArray): (x: ComplexArray) => void {
  const order = new Int32Array(n)
  const filled = new Int32Array(n)
  for (let k = 0; k < n; k++) {
    const row = pivotRow(n, re, im, k)
    order[k] = row
    if (row !== k) swapRows(n, re, im, k, row)
    const at = k * n + k
    const [pr, pi] = [re[at]!, im[at]!]
    const size = pr * pr + pi * pi
    let count = 0
    for (let j = k + 1; j < n; j++) if (re[k * n + j] !== 0 || im[k * n + j] !== 0) filled[count++] = j
    for (let i = k + 1; i < n; i++) {
      const [ar, ai] = [re[i * n + k]!, im[i * n + k]!]
      if (ar === 0 && ai === 0) continue
      const fr = (ar * pr + ai * pi) / size
      const fi = (ai * pr - ar * pi) / size
      re[i * n + k] = fr
      im[i * n + k] = fi
      for (let c = 0; c < count; c++) {
        const j = filled[c]!
        const [br, bi] = [re[k * n + j]!, im[k * n + j]!]
        re[i * n + j]! -= fr * br - fi * bi
        im[i * n + j]! -= fr * bi + fi * br
      }
    }
  }
  return (x) => substitute(n, { re, im }, order, x)
}

function pivotRow(n: number, re: Float64Array, im: Float64Array, k: number): number {
  const own = Math.abs(re[k * n + k]!) + Math.abs(im[k * n + k]!)
  let [row, largest] = [k, own]
  for (let i = k + 1; i < n; i++) {
    const size = Math.abs(re[i * n + k]!) + Math.abs(im[i * n + k]!)
    if (size > largest) [row, largest] = [i, size]
  }
  return own >= goodEnough * largest ? k : row
}

function swapRows(n: number, re: Float64Array, im: Float64Array, a: number, b: number): void {
  for (const part of [re, im])
    for (let j = 0; j < n; j++) {
      const held = part[a * n + j]!
      part[a * n + j] = part[b * n + j]!
      part[b * n + j] = held
    }
}

function substitute(n: number, { re, im }: ComplexArray, order: Int32Array, x: ComplexArray): void {
  for (let k = 0; k < n; k++) {
    const row = order[k]!
    if (row === k) continue
    for (const part of [x.re, x.im]) {
      const held = part[k]!
      part[k] = part[row]!
      part[row] = held
    }
  }
  for (let k = 0; k < n; k++) {
    const [xr, xi] = [x.re[k]!, x.im[k]!]
    if (xr === 0 && xi === 0) continue
    for (let i = k + 1; i < n; i++) {
      const [fr, fi] = [re[i * n + k]!, im[i * n + k]!]
      x.re[i]! -= fr * xr - fi * xi
      x.im[i]! -= fr * xi + fi * xr
    }
  }
  for (let k = n - 1; k >= 0; k--) {
    let [sr, si] = [x.re[k]!, x.im[k]!]
    for (let j = k + 1; j < n; j++) {
      const [ur, ui] = [re[k * n + j]!, im[k * n + j]!]
      sr -= ur * x.re[j]! - ui * x.im[j]!
      si -= ur * x.im[j]! + ui * x.re[j]!
    }
    const [pr, pi] = [re[k * n + k]!, im[k * n + k]!]
    const size = pr * pr + pi * pi
    x.re[k] = (sr * pr + si * pi) / size
    x.im[k] = (si * pr - sr * pi) / size
  }
}
