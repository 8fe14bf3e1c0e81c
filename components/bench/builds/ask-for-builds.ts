/** A build on the server, as far as the list needs it. */
export interface ServerBuild {
  id: string;
  name: string;
  planTitle: string;
}

export type BuildsAnswer =
  { state: 'builds'; builds: ServerBuild[] } | { state: 'signed-out' } | { state: 'no-signal'; message: string };

const LIMIT_MS = 15_000;

/** Builds of the account that is signed in here. An answer that is not ours (a Wi-Fi sign-in page) counts as none. */
export async function askForBuilds(signal: AbortSignal): Promise<BuildsAnswer> {
  let response: Response;
  let body: unknown;
  try {
    response = await fetch('/api/builds', {
      cache: 'no-store',
      signal: AbortSignal.any([signal, AbortSignal.timeout(LIMIT_MS)]),
    });
    if (response.status === 401) return { state: 'signed-out' };
    body = await response.json();
  } catch {
    return { state: 'no-signal', message: 'No signal, or the server cannot be reached.' };
  }
  const builds = (body as { builds?: unknown } | null)?.builds;
  if (!response.ok || !Array.isArray(builds) || !builds.every(isServerBuild)) {
    return {
      state: 'no-signal',
      message: 'What answered could not be understood; a Wi-Fi sign-in page may be in the way.',
    };
  }
  return { state: 'builds', builds };
}

function isServerBuild(row: unknown): row is ServerBuild {
  const build = row as Partial<ServerBuild> | null;
  return [build?.id, build?.name, build?.planTitle].every((field) => typeof field === 'string');
}
