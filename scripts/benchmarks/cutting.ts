import { parseArgs } from 'node:util';
import { benchmarkBoards } from './cutting/boards';
import { benchmarkSheets } from './cutting/sheets';

/**
 * Cutting plans measured: npm run benchmark -- cutting [--lists 500] [--solver-every 10] [--solver-seconds 10]
 * [--sheets-every 1] [--sheets-ms 1000] [--only boards|sheets]
 * Prints figures and judges nothing.
 */
const { values } = parseArgs({
  options: {
    lists: { type: 'string', default: '500' },
    'solver-every': { type: 'string', default: '10' },
    'solver-seconds': { type: 'string', default: '10' },
    'sheets-every': { type: 'string', default: '1' },
    'sheets-ms': { type: 'string', default: '1000' },
    only: { type: 'string' },
  },
});

if (values.only !== 'sheets')
  await benchmarkBoards({
    lists: Number(values.lists),
    solverEvery: Number(values['solver-every']),
    solverSeconds: Number(values['solver-seconds']),
  });

if (values.only !== 'boards')
  benchmarkSheets({ every: Number(values['sheets-every']), timeLimitMs: Number(values['sheets-ms']) });
