import { checkSheetPlan, planSheets, type SheetPlan, type SheetRequest } from '@/lib/domain/cutting';
import { publishedSheets } from '@/tests/reference/published-sheets';
import { peerNames, sheetsOfPeer } from './sheet-peers';
import { printTable, quantile } from './table';
import { sheetJobs } from './workshop-sheets';

interface Options {
  /** Of the published instances, every which one. */
  every: number;
  timeLimitMs: number;
}

interface Run {
  plan: SheetPlan;
  ms: number;
  /** Cost of the first plan and when it stood, ms. */
  first: { cost: number; ms: number };
}

/** Sheet plans beside the best known, the bound and general-purpose packers on the same instances; prints, judges nothing. */
export function benchmarkSheets({ every, timeLimitMs }: Options): void {
  for (const turnable of [false, true]) published(turnable, every, timeLimitMs);
  workshop(timeLimitMs);
}

function published(turnable: boolean, every: number, timeLimitMs: number): void {
  const instances = publishedSheets(turnable).filter((_, index) => index % every === 0);
  const runs = instances.map(({ request }) => measured({ ...request, timeLimitMs }));
  const best = sum(instances.map(({ bestKnown }) => bestKnown));
  const ours = sum(runs.map(({ plan }) => plan.cost));
  const rows: [string, string | number][] = [
    ['best known sheets', best],
    ['our sheets', ours],
    ['over best known, of all sheets', percent(ours / best - 1)],
    [
      'over best known, mean of instances',
      percent(mean(runs.map(({ plan }, i) => plan.cost / instances[i]!.bestKnown - 1))),
    ],
    ['first answer, of all sheets', percent(sum(runs.map(({ first }) => first.cost)) / best - 1)],
    ['first answer, ms p50 / p95 / max', spread(runs.map(({ first }) => first.ms))],
    ['proved', `${runs.filter(({ plan }) => plan.proved).length} of ${runs.length}`],
    [
      'wrong by the check',
      faulty(
        instances.map(({ request }) => request),
        runs,
      ),
    ],
  ];
  for (const name of peerNames) {
    const sheets = instances.map(({ request }) => sheetsOfPeer(name, request, turnable));
    const valid = sheets.flatMap((count, i) =>
      count === null ? [] : [{ count, ours: runs[i]!.plan.cost, best: instances[i]!.bestKnown }],
    );
    const over = percent(sum(valid.map(({ count }) => count)) / sum(valid.map(({ best: known }) => known)) - 1);
    rows.push([
      name,
      `${over} over best known on the ${valid.length} of ${sheets.length} that can be cut; fewer sheets than ours on ${valid.filter(({ count, ours: own }) => count < own).length}`,
    ]);
  }
  printTable(
    `Sheets, ${instances.length} published instances of 20 to 60 pieces, ${turnable ? 'turned as they fit' : 'as they lie'}, ${timeLimitMs} ms each`,
    rows,
  );
}

function workshop(timeLimitMs: number): void {
  const jobs = sheetJobs();
  const runs = jobs.map(({ request }) => measured({ ...request, timeLimitMs }));
  printTable(`Sheets, ${jobs.length} plywood jobs, half of the parts bound to the grain, ${timeLimitMs} ms each`, [
    ['our sheets', sum(runs.map(({ plan }) => plan.cost))],
    ['lower bound', sum(runs.map(({ plan }) => plan.lowerBound))],
    ['first answer', sum(runs.map(({ first }) => first.cost))],
    ['first answer, ms p50 / p95 / max', spread(runs.map(({ first }) => first.ms))],
    ['proved', `${runs.filter(({ plan }) => plan.proved).length} of ${jobs.length}`],
    ['time, ms p50 / p95 / max', spread(runs.map(({ ms }) => ms))],
    [
      'wrong by the check',
      faulty(
        jobs.map(({ request }) => request),
        runs,
      ),
    ],
  ]);
}

function measured(request: SheetRequest): Run {
  const from = performance.now();
  let first: Run['first'] | null = null;
  const plan = planSheets(request, {
    onProgress: ({ cost }) => (first ??= { cost, ms: performance.now() - from }),
  });
  return { plan, ms: performance.now() - from, first: first ?? { cost: plan.cost, ms: performance.now() - from } };
}

const faulty = (requests: readonly SheetRequest[], runs: readonly Run[]) =>
  runs.filter(({ plan }, i) => checkSheetPlan(requests[i]!, plan).length > 0).length;
const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const mean = (values: readonly number[]) => sum(values) / values.length;
const percent = (share: number) => `${(share * 100).toFixed(2)} %`;
const spread = (ms: readonly number[]) => [0.5, 0.95, 1].map((share) => quantile(ms, share).toFixed(0)).join(' / ');
