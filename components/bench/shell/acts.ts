/** Everything that writes. Loaded after the first paint: judging an entry needs the schemas, reading the bench does not. */
export type Acts = typeof import('./all-acts');

let loading: Promise<Acts> | null = null;

/** The mutations, loaded once; a load that failed is tried again at the next act. */
export function loadActs(): Promise<Acts> {
  loading ??= import('./all-acts').catch((error: unknown) => {
    loading = null;
    throw error;
  });
  return loading;
}
