export * from './boards/check-board-plan';
export * from './boards/plan-boards';
export * from './boards/replan-boards';
export type * from './boards/request';
export * from './request-error';
export type * from './run-control';
