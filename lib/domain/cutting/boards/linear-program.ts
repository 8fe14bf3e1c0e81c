import { BasisInverse } from './basis-inverse';
import { SparseColumns } from './sparse-columns';

const FEASIBLE = 1e-7;
const PIVOT = 1e-9;
const REFACTOR_EVERY = 80;

const AT_LOWER = 0;
const AT_UPPER = 1;
const BASIC = 2;

/**
 * A linear programme that grows and whose bounds move: minimise cost over columns within bounds, each row at least its
 * right-hand side. Every row has a dear column of its own (`penalty`), so that there is always a solution.
 *
 * Revised simplex with bounds on every column and a dense inverse of the basis, which suits some hundred rows: primal
 * after columns were added ({@link improve}), dual after bounds moved ({@link solve}). Floating point: what it returns
 * steers the search and is never itself taken for a proof.
 */
export class LinearProgram {
  readonly rows: number;
  /** Cost of the present solution; see {@link valueOf} for the solution itself. */
  value = 0;
  readonly duals: Float64Array;
  private readonly inverse: BasisInverse;
  private readonly matrix = new SparseColumns();
  private readonly head: Int32Array;
  private readonly basic: Float64Array;
  private readonly direction: Float64Array;
  private readonly cost: number[] = [];
  private readonly lower: number[] = [];
  private readonly upper: number[] = [];
  private readonly place: number[] = [];
  private readonly row: number[] = [];
  private pivots = 0;

  constructor(
    private readonly rightHand: ArrayLike<number>,
    penalties: ArrayLike<number>,
    private readonly costScale: number,
  ) {
    const rows = rightHand.length;
    this.rows = rows;
    this.duals = new Float64Array(rows);
    this.inverse = new BasisInverse(rows);
    this.head = new Int32Array(rows);
    this.basic = new Float64Array(rows);
    this.direction = new Float64Array(rows);
    for (let r = 0; r < rows; r++) {
      this.addColumn(penalties[r]!, [r], [1], 0, 1e9);
      this.enterBasis(r, r);
    }
    for (let r = 0; r < rows; r++) this.addColumn(0, [r], [-1], 0, 1e9);
    this.refreshValues();
  }

  /** @returns the column's number */
  addColumn(cost: number, rows: ArrayLike<number>, entries: ArrayLike<number>, lower: number, upper: number): number {
    this.cost.push(cost);
    this.lower.push(lower);
    this.upper.push(upper);
    this.place.push(AT_LOWER);
    this.row.push(-1);
    return this.matrix.add(rows, entries);
  }

  get columns(): number {
    return this.matrix.count;
  }

  setBounds(column: number, lower: number, upper: number): void {
    this.lower[column] = lower;
    this.upper[column] = upper;
  }

  lowerOf(column: number): number {
    return this.lower[column]!;
  }

  upperOf(column: number): number {
    return this.upper[column]!;
  }

  valueOf(column: number): number {
    const place = this.place[column]!;
    if (place === BASIC) return this.basic[this.row[column]!]!;
    return place === AT_UPPER ? this.upper[column]! : this.lower[column]!;
  }

  /** Cost of a column less the worth of what it covers. */
  reducedCost(column: number): number {
    return this.cost[column]! - this.matrix.dot(column, this.duals);
  }

  /** After bounds moved: dual simplex, then primal for what is left. @returns false when it gave up */
  solve(isTimeUp: () => boolean): boolean {
    this.refreshDuals();
    const tolerance = this.dualTolerance;
    for (let j = 0; j < this.columns; j++) {
      if (this.place[j] === BASIC) continue;
      const reduced = this.reducedCost(j);
      if (reduced < -tolerance) this.place[j] = AT_UPPER;
      else if (reduced > tolerance) this.place[j] = AT_LOWER;
    }
    this.refreshValues();
    return this.makeFeasible(isTimeUp) && this.improve(isTimeUp);
  }

  /** Primal simplex from a feasible basis, after columns were added. @returns false when it gave up */
  improve(isTimeUp: () => boolean): boolean {
    const limit = 2_000 + 60 * this.rows;
    for (let step = 0; step < limit; step++) {
      if ((step & 31) === 31 && isTimeUp()) return false;
      this.refreshDuals();
      const entering = this.mostPromising(step > limit / 2);
      if (entering < 0) {
        this.refreshValue();
        return true;
      }
      this.computeDirection(entering);
      const sign = this.place[entering] === AT_LOWER ? 1 : -1;
      const { row, length, toUpper } = this.primalRatio(entering, sign);
      for (let r = 0; r < this.rows; r++) this.basic[r]! -= sign * length * this.direction[r]!;
      if (row < 0) this.place[entering] = sign > 0 ? AT_UPPER : AT_LOWER;
      else {
        const from = sign > 0 ? this.lower[entering]! : this.upper[entering]!;
        this.pivot(row, entering, from + sign * length, toUpper);
      }
    }
    return false;
  }

  private get dualTolerance(): number {
    return 1e-9 * this.costScale;
  }

  private mostPromising(first: boolean): number {
    let best = -1;
    let most = this.dualTolerance;
    for (let j = 0; j < this.columns; j++) {
      const place = this.place[j]!;
      if (place === BASIC || this.upper[j]! - this.lower[j]! < FEASIBLE) continue;
      const reduced = this.reducedCost(j);
      const gain = place === AT_LOWER ? -reduced : reduced;
      if (gain <= most) continue;
      if (first) return j;
      most = gain;
      best = j;
    }
    return best;
  }

  private primalRatio(entering: number, sign: number): { row: number; length: number; toUpper: boolean } {
    let length = this.upper[entering]! - this.lower[entering]!;
    let row = -1;
    let toUpper = false;
    let size = 0;
    for (let r = 0; r < this.rows; r++) {
      const slope = sign * this.direction[r]!;
      if (Math.abs(slope) < PIVOT) continue;
      const bound = slope > 0 ? this.lower[this.head[r]!]! : this.upper[this.head[r]!]!;
      const step = Math.max(0, (this.basic[r]! - bound) / slope);
      if (step > length + 1e-10 || (step > length - 1e-10 && Math.abs(slope) <= size)) continue;
      length = Math.min(step, length);
      row = r;
      toUpper = slope < 0;
      size = Math.abs(slope);
    }
    return { row, length, toUpper };
  }

  private makeFeasible(isTimeUp: () => boolean): boolean {
    const limit = 2_000 + 60 * this.rows;
    for (let step = 0; step < limit; step++) {
      if ((step & 31) === 31 && isTimeUp()) return false;
      const leaving = this.mostInfeasible();
      if (leaving < 0) return true;
      const column = this.head[leaving]!;
      const tooSmall = this.basic[leaving]! < this.lower[column]!;
      const entering = this.dualRatio(leaving, tooSmall);
      if (entering < 0) return false;
      this.computeDirection(entering);
      const slope = this.direction[leaving]!;
      if (Math.abs(slope) < PIVOT) return false;
      const bound = tooSmall ? this.lower[column]! : this.upper[column]!;
      const move = (this.basic[leaving]! - bound) / slope;
      const from = this.valueOf(entering);
      for (let r = 0; r < this.rows; r++) this.basic[r]! -= move * this.direction[r]!;
      this.pivot(leaving, entering, from + move, !tooSmall);
      this.refreshDuals();
    }
    return false;
  }

  private mostInfeasible(): number {
    let leaving = -1;
    let most = FEASIBLE;
    for (let r = 0; r < this.rows; r++) {
      const column = this.head[r]!;
      const amount = Math.max(this.lower[column]! - this.basic[r]!, this.basic[r]! - this.upper[column]!);
      if (amount > most) {
        most = amount;
        leaving = r;
      }
    }
    return leaving;
  }

  private dualRatio(leaving: number, tooSmall: boolean): number {
    const base = leaving * this.rows;
    let entering = -1;
    let least = Infinity;
    let size = 0;
    for (let j = 0; j < this.columns; j++) {
      const place = this.place[j]!;
      if (place === BASIC || this.upper[j]! - this.lower[j]! < FEASIBLE) continue;
      const slope = this.matrix.dot(j, this.inverse.values, base);
      const useful = tooSmall === (place === AT_LOWER) ? -slope : slope;
      if (useful < 1e-8) continue;
      const ratio = Math.abs(this.reducedCost(j)) / useful;
      if (ratio > least + 1e-11 || (ratio > least - 1e-11 && useful <= size)) continue;
      least = Math.min(ratio, least);
      size = useful;
      entering = j;
    }
    return entering;
  }

  private computeDirection(column: number): void {
    this.matrix.transform(column, this.inverse.values, this.rows, this.direction);
  }

  private enterBasis(row: number, column: number): void {
    this.head[row] = column;
    this.row[column] = row;
    this.place[column] = BASIC;
  }

  private pivot(row: number, entering: number, value: number, toUpper: boolean): void {
    const leaving = this.head[row]!;
    this.place[leaving] = toUpper ? AT_UPPER : AT_LOWER;
    this.row[leaving] = -1;
    this.enterBasis(row, entering);
    this.basic[row] = value;
    this.inverse.replace(row, this.direction);
    if (++this.pivots % REFACTOR_EVERY !== 0) return;
    this.inverse.rebuild(this.matrix, this.head);
    this.refreshValues();
  }

  private refreshDuals(): void {
    const { rows, duals } = this;
    const inverse = this.inverse.values;
    duals.fill(0);
    for (let r = 0; r < rows; r++) {
      const cost = this.cost[this.head[r]!]!;
      if (cost === 0) continue;
      for (let c = 0; c < rows; c++) duals[c]! += cost * inverse[r * rows + c]!;
    }
  }

  private refreshValues(): void {
    const { rows, basic } = this;
    const inverse = this.inverse.values;
    const left = Float64Array.from(this.rightHand);
    for (let j = 0; j < this.columns; j++) {
      if (this.place[j] === BASIC) continue;
      const value = this.place[j] === AT_UPPER ? this.upper[j]! : this.lower[j]!;
      if (value === 0) continue;
      this.matrix.addTo(j, left, -value);
    }
    for (let r = 0; r < rows; r++) {
      let sum = 0;
      for (let c = 0; c < rows; c++) sum += inverse[r * rows + c]! * left[c]!;
      basic[r] = sum;
    }
  }

  private refreshValue(): void {
    let value = 0;
    for (let j = 0; j < this.columns; j++) if (this.cost[j] !== 0) value += this.cost[j]! * this.valueOf(j);
    this.value = value;
  }
}
