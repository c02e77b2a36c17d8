import { catalogueResources } from '#contract';
import { cableTypes, dispenserTypes, greases, moduleTypes, supplyTypes } from '#schema';

const tables = { dispenserTypes, moduleTypes, cableTypes, supplyTypes, greases } as const;
type Name = keyof typeof tables;

/** Each kind of catalogue entry with its table and what it is called. */
export const catalogueKinds = (Object.keys(tables) as Name[]).map((name) => ({ name, table: tables[name], ...catalogueResources[name] }));
export type CatalogueKind = (typeof catalogueKinds)[number];
