export * from './angle';
export * from './format-length';
export * from './length';
export * from './money';
export * from './parse-length';
