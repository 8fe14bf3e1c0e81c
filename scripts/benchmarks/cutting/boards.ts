import { checkBoardPlan, planBoards, type BoardRequest } from '@/lib/domain/cutting';
import { publishedBoards } from '@/tests/reference/published-boards';
import { exactBoards } from './exact-boards';
import { firstFitCost } from './first-fit';
import { printTable, quantile } from './table';
import { oneLengthLists, severalLengthsLists, type WorkshopList } from './workshop-lists';

export interface BoardBenchmark {
  /** How many of the 500 workshop lists of each kind. */
  lists: number;
  /** The outside solver checks every so many lists; 0 leaves it out. */
  solverEvery: number;
  solverSeconds: number;
}

/**
 * Boards: the workshop lists and the published instances, planned by us, by first-fit decreasing and, for every so many
 * lists, by a general-purpose solver over all cutting patterns. General-purpose packers for two and three dimensions have
 * no notion of a board's kerf or price and are not compared here.
 */
export async function benchmarkBoards(options: BoardBenchmark): Promise<void> {
  await workshop('Boards, one length of stock, 1 s each', oneLengthLists(), options);
  await workshop('Boards, several lengths and prices, 1 s each', severalLengthsLists(), options);
  published();
}

async function workshop(title: string, all: WorkshopList[], options: BoardBenchmark): Promise<void> {
  const lists = all.slice(0, options.lists);
  const times: number[] = [];
  const gaps: number[] = [];
  const firstFit: number[] = [];
  const solverTimes: number[] = [];
  let proved = 0;
  let wrong = 0;
  const solver = { asked: 0, optimal: 0, equal: 0, better: 0, contradicted: 0 };
  for (const [n, { name, request }] of lists.entries()) {
    const { plan, ms } = timed(request, 1_000);
    times.push(ms);
    wrong += checkBoardPlan(request, plan).length > 0 || plan.unplaced.length > 0 ? 1 : 0;
    proved += plan.proved ? 1 : 0;
    gaps.push(plan.cost / plan.lowerBound - 1);
    firstFit.push(firstFitCost(request) / plan.cost - 1);
    if (!plan.proved) console.log(`  not proved: ${name}, ${percent(plan.cost / plan.lowerBound - 1)} above the bound`);
    if (options.solverEvery === 0 || n % options.solverEvery !== 0) continue;
    solver.asked++;
    const start = performance.now();
    const exact = await exactBoards(request, options.solverSeconds);
    solverTimes.push(performance.now() - start);
    if (!exact) continue;
    if (exact.isOptimal) solver.optimal++;
    if (exact.isOptimal && exact.cost === plan.cost) solver.equal++;
    if (exact.cost < plan.cost) solver.better++;
    if (exact.cost < plan.lowerBound || (plan.proved && exact.isOptimal && exact.cost !== plan.cost))
      solver.contradicted++;
  }
  printTable(title, [
    ['lists', lists.length],
    ['plans that do not pass the check', wrong],
    ['proved optimal', proved],
    ['gap to our bound, mean / worst', `${percent(mean(gaps))} / ${percent(Math.max(...gaps))}`],
    ['time p50 / p95 / max', spread(times)],
    ['first-fit decreasing dearer on', firstFit.filter((excess) => excess > 1e-9).length],
    ['first-fit decreasing, mean / worst excess', `${percent(mean(firstFit))} / ${percent(Math.max(...firstFit))}`],
    ['solver asked / ended with the optimum', `${solver.asked} / ${solver.optimal}`],
    ['solver: optimum equals ours / has a better plan', `${solver.equal} / ${solver.better}`],
    ['solver contradicts our bound or proof', solver.contradicted],
    ['solver time p50 / p95 / max', solverTimes.length > 0 ? spread(solverTimes) : 'not asked'],
  ]);
}

function published(): void {
  const times: number[] = [];
  let best = 0;
  let proved = 0;
  let firstFit = 0;
  const instances = publishedBoards();
  for (const { name, bestKnown, request } of instances) {
    const { plan, ms } = timed(request, 5_000);
    times.push(ms);
    const isSound = checkBoardPlan(request, plan).length === 0;
    if (isSound && plan.boards.length === bestKnown) best++;
    else console.log(`  ${name}: ${plan.boards.length} boards, best known ${bestKnown}`);
    proved += plan.proved ? 1 : 0;
    firstFit += firstFitCost(request) === bestKnown * request.stock[0]!.length ? 1 : 0;
  }
  printTable('Boards, published instances, 5 s each', [
    ['instances', instances.length],
    ['best known reached', best],
    ['proved', proved],
    ['first-fit decreasing reaches', firstFit],
    ['time p50 / p95 / max', spread(times)],
  ]);
}

function timed(request: BoardRequest, timeLimitMs: number) {
  const start = performance.now();
  const plan = planBoards({ ...request, timeLimitMs });
  return { plan, ms: performance.now() - start };
}

function spread(times: number[]): string {
  return [0.5, 0.95, 1].map((share) => `${quantile(times, share).toFixed(0)} ms`).join(' / ');
}

function mean(values: number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

function percent(share: number): string {
  return `${(share * 100).toFixed(3)} %`;
}
