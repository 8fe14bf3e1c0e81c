/** Operations that take a piece to its size. */
export const CUTTING: ReadonlySet<string> = new Set(['rip', 'crosscut', 'sheet-cut']);
