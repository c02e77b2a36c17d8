export type * from './design.ts';
export type * from './findings.ts';
export type * from './assessment.ts';
