export { checkBoardPlan } from './boards/check-board-plan';
export { planBoards } from './boards/plan-boards';
export { remainderOf, replanBoards, type BoardReplan, type BoardsUnderWay } from './boards/replan-boards';
export type {
  AvoidedStretch,
  BoardCut,
  BoardPart,
  BoardPlan,
  BoardRequest,
  BoardStock,
  PlannedBoard,
  UnplacedPart,
} from './boards/request';
export { CuttingRequestError } from './request-error';
export type { RunControl } from './run-control';
