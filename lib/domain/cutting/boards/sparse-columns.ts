/** Columns of a matrix that grows, only their entries other than zero. */
export class SparseColumns {
  count = 0;
  private readonly start: number[] = [0];
  private readonly index: number[] = [];
  private readonly entry: number[] = [];

  /** @returns the column's number */
  add(rows: ArrayLike<number>, entries: ArrayLike<number>): number {
    for (let k = 0; k < rows.length; k++) {
      this.index.push(rows[k]!);
      this.entry.push(entries[k]!);
    }
    this.start.push(this.index.length);
    return this.count++;
  }

  /** The column times the part of a vector that begins at `base`. */
  dot(column: number, vector: Float64Array, base = 0): number {
    let sum = 0;
    const end = this.start[column + 1]!;
    for (let k = this.start[column]!; k < end; k++) sum += vector[base + this.index[k]!]! * this.entry[k]!;
    return sum;
  }

  /** Adds `factor` times the column to a vector, its entries `stride` apart from `base` on. */
  addTo(column: number, vector: Float64Array, factor: number, stride = 1, base = 0): void {
    const end = this.start[column + 1]!;
    for (let k = this.start[column]!; k < end; k++) vector[base + this.index[k]! * stride]! += factor * this.entry[k]!;
  }

  /** `matrix` (square, rows one after the other) times the column. */
  transform(column: number, matrix: Float64Array, size: number, into: Float64Array): void {
    into.fill(0);
    const end = this.start[column + 1]!;
    for (let k = this.start[column]!; k < end; k++) {
      const at = this.index[k]!;
      const entry = this.entry[k]!;
      for (let r = 0; r < size; r++) into[r]! += matrix[r * size + at]! * entry;
    }
  }
}
