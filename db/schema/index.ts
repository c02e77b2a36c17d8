export * from './accounts.ts';
export * from './catalogue.ts';
export * from './hardware.ts';
export * from './imports.ts';
export * from './mapping.ts';
export * from './points.ts';
export * from './projects.ts';
export * from './wiring.ts';
