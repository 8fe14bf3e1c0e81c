import type { SparseColumns } from './sparse-columns';

const SINGULAR = 1e-11;

/** The dense inverse of a simplex basis, row by row; it begins as the identity. */
export class BasisInverse {
  readonly values: Float64Array;

  constructor(private readonly size: number) {
    this.values = new Float64Array(size * size);
    for (let r = 0; r < size; r++) this.values[r * size + r] = 1;
  }

  /** Row `row` of the basis is taken by a column whose transform is `direction`. */
  replace(row: number, direction: Float64Array): void {
    const { size, values } = this;
    const base = row * size;
    const scale = 1 / direction[row]!;
    for (let c = 0; c < size; c++) values[base + c]! *= scale;
    for (let r = 0; r < size; r++) {
      const factor = direction[r]!;
      if (r === row || factor === 0) continue;
      const other = r * size;
      for (let c = 0; c < size; c++) values[other + c]! -= factor * values[base + c]!;
    }
  }

  /** Made afresh from the basis, so that rounding does not build up (Gauss-Jordan, largest pivot); kept if that fails. */
  rebuild(columns: SparseColumns, head: Int32Array): void {
    const { size } = this;
    const width = 2 * size;
    const work = new Float64Array(size * width);
    for (let c = 0; c < size; c++) {
      columns.addTo(head[c]!, work, 1, width, c);
      work[c * width + size + c] = 1;
    }
    for (let c = 0; c < size; c++) {
      let best = c;
      for (let r = c + 1; r < size; r++)
        if (Math.abs(work[r * width + c]!) > Math.abs(work[best * width + c]!)) best = r;
      if (Math.abs(work[best * width + c]!) < SINGULAR) return;
      if (best !== c) swapRows(work, width, c, best);
      const scale = 1 / work[c * width + c]!;
      for (let k = c; k < width; k++) work[c * width + k]! *= scale;
      for (let r = 0; r < size; r++) {
        const factor = work[r * width + c]!;
        if (r === c || factor === 0) continue;
        for (let k = c; k < width; k++) work[r * width + k]! -= factor * work[c * width + k]!;
      }
    }
    for (let r = 0; r < size; r++) this.values.set(work.subarray(r * width + size, (r + 1) * width), r * size);
  }
}

function swapRows(matrix: Float64Array, width: number, a: number, b: number): void {
  const row = matrix.slice(a * width, (a + 1) * width);
  matrix.copyWithin(a * width, b * width, (b + 1) * width);
  matrix.set(row, b * width);
}
