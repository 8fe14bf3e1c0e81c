import { onRightNode } from './setup/check-node.mjs';

onRightNode(() => import('./main/test.mjs'));
