/** The value below which a share of the values lies; 1 is the largest. */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? NaN;
}

/** Prints a titled list of figures, names aligned. */
export function printTable(title: string, rows: readonly (readonly [name: string, value: string | number])[]): void {
  const width = Math.max(...rows.map(([name]) => name.length));
  console.log(`\n${title}`);
  for (const [name, value] of rows) console.log(`  ${name.padEnd(width)}  ${value}`);
}
