export type * from './design.ts';
export type * from './findings.ts';
export type * from './assessment.ts';
export * from './points/index.ts';
export * from './explain.ts';
export * from './format.ts';
