import { cableNodes as nodeResource, circuits as circuitResource, supplies as supplyResource } from '#contract';
import { cableNodes, circuits, supplies } from '#schema';
import type { Collection } from '../platform/editing/collection.ts';
import { labelBy } from '../platform/editing/labels.ts';
import { boxesFormATree, dispensersHangInTheirCircuit } from './wiring-rules.ts';

export const wiringCollections: readonly Collection[] = [
  { name: 'supplies', resource: supplyResource, table: supplies, noun: 'supply', labelOf: labelBy('name') },
  { name: 'circuits', resource: circuitResource, table: circuits, noun: 'circuit', labelOf: labelBy('name') },
  {
    name: 'cableNodes', resource: nodeResource, table: cableNodes, noun: 'junction box', labelOf: labelBy('location'),
    rules: [boxesFormATree, dispensersHangInTheirCircuit],
  },
];
