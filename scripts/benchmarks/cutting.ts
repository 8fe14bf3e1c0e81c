import { parseArgs } from 'node:util';
import { benchmarkBoards } from './cutting/boards';

/**
 * Cutting plans measured: npm run benchmark -- cutting [--lists 500] [--solver-every 10] [--solver-seconds 10]
 * Prints figures and judges nothing.
 */
const { values } = parseArgs({
  options: {
    lists: { type: 'string', default: '500' },
    'solver-every': { type: 'string', default: '10' },
    'solver-seconds': { type: 'string', default: '10' },
  },
});

await benchmarkBoards({
  lists: Number(values.lists),
  solverEvery: Number(values['solver-every']),
  solverSeconds: Number(values['solver-seconds']),
});
