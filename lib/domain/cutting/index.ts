export * from './boards/check-board-plan';
export * from './boards/plan-boards';
export * from './boards/replan-boards';
export type * from './boards/request';
export * from './request-error';
export type * from './run-control';
export { checkSheetPlan } from './sheets/check-sheet-plan';
export { planSheets } from './sheets/plan-sheets';
export type {
  Cut,
  CutDirection,
  GrainWish,
  Placement,
  PlannedSheet,
  Rectangle,
  SheetPart,
  SheetPlan,
  SheetRequest,
  SheetStock,
} from './sheets/request';
export { cuttingJobs, usualHabits, type CuttingHabits, type CuttingJob } from './cutting-jobs';
export { cutOrder, wasteOf, type OrderedCut } from './sheets/cut-order';
