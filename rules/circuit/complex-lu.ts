/** Complex numbers in a row, the real and the imaginary part of each by turns: what is quick to go through. */
export type ComplexArray = Float64Array

export const zeros = (length: number): ComplexArray => new Float64Array(2 * length)

/** A diagonal entry this part of the largest in its column stays the pivot: changing rows would fill the matrix. */
const goodEnough = 0.1

/** A matrix as the product of a lower and an upper triangle. */
export type Factors = {
  n: number
  /** n × n in rows: both triangles, the lower without its diagonal of ones. */
  triangles: ComplexArray
  /** The row that came to each place when it was its turn. */
  order: number[]
  /** Of each row the columns that are not 0, one row after another; `starts` says where each begins. */
  filled: number[]
  starts: number[]
}

/**
 * Factors a square complex matrix, in place.
 *
 * Gaussian elimination with partial pivoting (Golub and Van Loan, "Matrix Computations", section 3.4), in which the
 * diagonal keeps its place while it is large enough. Zeros are passed over: a wiring has few branches at a node.
 * @param a n × n entries in rows; becomes the factors. Must not be singular.
 */
export function factorMatrix(n: number, a: ComplexArray): Factors {
  const order: number[] = []
  const columns: number[] = []
  const width = 2 * n
  for (let k = 0; k < n; k++) {
    const row = pivotRow(n, a, k)
    order.push(row)
    if (row !== k) swapRows(width, a, k, row)
    const own = k * width
    const [pr, pi] = [a[own + 2 * k]!, a[own + 2 * k + 1]!]
    const size = pr * pr + pi * pi
    let count = 0
    for (let j = 2 * k + 2; j < width; j += 2)
      if (a[own + j] !== 0 || a[own + j + 1] !== 0) columns[count++] = j
    for (let other = own + width; other < n * width; other += width) {
      const [ar, ai] = [a[other + 2 * k]!, a[other + 2 * k + 1]!]
      if (ar === 0 && ai === 0) continue
      const fr = (ar * pr + ai * pi) / size
      const fi = (ai * pr - ar * pi) / size
      a[other + 2 * k] = fr
      a[other + 2 * k + 1] = fi
      for (let c = 0; c < count; c++) {
        const j = columns[c]!
        const [br, bi] = [a[own + j]!, a[own + j + 1]!]
        a[other + j]! -= fr * br - fi * bi
        a[other + j + 1]! -= fr * bi + fi * br
      }
    }
  }
  return { n, triangles: a, order, ...findFilled(n, a) }
}

function pivotRow(n: number, a: ComplexArray, k: number): number {
  const own = Math.abs(a[2 * (k * n + k)]!) + Math.abs(a[2 * (k * n + k) + 1]!)
  let [row, largest] = [k, own]
  for (let i = k + 1; i < n; i++) {
    const size = Math.abs(a[2 * (i * n + k)]!) + Math.abs(a[2 * (i * n + k) + 1]!)
    if (size > largest) [row, largest] = [i, size]
  }
  return own >= goodEnough * largest ? k : row
}

function swapRows(width: number, a: ComplexArray, one: number, other: number): void {
  for (let j = 0; j < width; j++) {
    const held = a[one * width + j]!
    a[one * width + j] = a[other * width + j]!
    a[other * width + j] = held
  }
}

function findFilled(n: number, a: ComplexArray): Pick<Factors, 'filled' | 'starts'> {
  const filled: number[] = []
  const starts = [0]
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++)
      if (i !== j && (a[2 * (i * n + j)] !== 0 || a[2 * (i * n + j) + 1] !== 0)) filled.push(j)
    starts.push(filled.length)
  }
  return { filled, starts }
}

/** Solves for a right-hand side of n entries, in place. */
export function substitute({ n, triangles: a, order, filled, starts }: Factors, x: ComplexArray): void {
  for (let k = 0; k < n; k++) if (order[k] !== k) swapRows(2, x, k, order[k]!)
  let first = 0
  while (first < n && x[2 * first] === 0 && x[2 * first + 1] === 0) first++
  for (let i = first; i < n; i++) {
    let [sr, si] = [x[2 * i]!, x[2 * i + 1]!]
    for (let c = starts[i]!; c < starts[i + 1]! && filled[c]! < i; c++) {
      const j = filled[c]!
      const at = 2 * (i * n + j)
      sr -= a[at]! * x[2 * j]! - a[at + 1]! * x[2 * j + 1]!
      si -= a[at]! * x[2 * j + 1]! + a[at + 1]! * x[2 * j]!
    }
    x[2 * i] = sr
    x[2 * i + 1] = si
  }
  for (let i = n - 1; i >= 0; i--) {
    let [sr, si] = [x[2 * i]!, x[2 * i + 1]!]
    for (let c = starts[i + 1]! - 1; c >= starts[i]! && filled[c]! > i; c--) {
      const j = filled[c]!
      const at = 2 * (i * n + j)
      sr -= a[at]! * x[2 * j]! - a[at + 1]! * x[2 * j + 1]!
      si -= a[at]! * x[2 * j + 1]! + a[at + 1]! * x[2 * j]!
    }
    const own = 2 * (i * n + i)
    const [pr, pi] = [a[own]!, a[own + 1]!]
    const size = pr * pr + pi * pi
    x[2 * i] = (sr * pr + si * pi) / size
    x[2 * i + 1] = (si * pr - sr * pi) / size
  }
}
