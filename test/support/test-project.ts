import { v7 as newId } from 'uuid';
import type { Agent } from './test-app.ts';

/** A small project made through the API: two lanes, one output and one input module, a circuit with two boxes. */
export interface TestProject {
  readonly id: string;
  readonly url: string;
  readonly ids: Readonly<Record<'cabinet' | 'controller' | 'outputs' | 'inputs' | 'supply' | 'circuit' | 'box' | 'farBox' | 'pointA' | 'pointB' | 'dispenserA' | 'dispenserB' | 'assignment', string>>;
  readonly types: TestTypes;
}

export interface TestTypes {
  readonly dispenser: string;
  readonly output: string;
  readonly input: string;
  readonly supply: string;
}

export const dispenserType = (id: string, name = 'Dispenser, four-core') => ({
  id, name, wiring: 'four-core', cartridgesUl: [60_000, 120_000], residualUl: 1000, doseMinUl: 100, doseMaxUl: 3000, doseStepUl: 100,
  runMsPerStep: 4000, recoveryMs: 10_000, triggerMs: 500, timedMonths: [1, 3, 6], load: 'constant-current', runA: 0.2, peakA: 0.4, idleA: 0.01,
  minV: 18, controlInputA: 0.005, controlOnV: 15, offStateA: 0.001, controlPolarity: 'sourcing',
  status: { polarity: 'sourcing', maxA: 0.05, dropV: 1, leakageA: 0.0001 }, pins: { supply: '1', pulse: '2', zero: '3', status: '4' },
  protectionLevels: ['Dc'], maxSurfaceC: 85,
});

export const moduleType = (id: string, kind: 'output' | 'input', name = `${kind} module`) => ({
  id, name, kind, technology: kind === 'output' ? 'transistor' : 'input', polarity: kind === 'output' ? 'sourcing' : 'sinking',
  channels: 16, channelsPerGroup: 8, channelA: kind === 'output' ? 0.5 : null, groupA: kind === 'output' ? 2 : null, moduleA: null, channelPeakA: null,
  dropV: 0.3, leakageA: 0.0001, shortCircuitA: null, minLoadA: null, ratedOperations: null,
  inputType: kind === 'input' ? 3 : null, inputA: kind === 'input' ? 0.0025 : null,
});

const supplyType = (id: string) => ({
  id, name: 'Supply, 10 A', ratedA: 10, deratingFromC: 50, deratingPercentPerK: 2, tolerancePercent: 1, shortCircuitA: 15, extraLowVoltage: 'PELV',
});

/** Adds the catalogue types that a test project uses. */
export async function buildTypes(engineer: Agent): Promise<TestTypes> {
  const types = { dispenser: newId(), output: newId(), input: newId(), supply: newId() };
  const add = (path: string, entry: object) => engineer.post(`/api/v1/catalogue/${path}`).send(entry).expect(201);
  await add('dispenser-types', dispenserType(types.dispenser));
  await add('module-types', moduleType(types.output, 'output'));
  await add('module-types', moduleType(types.input, 'input'));
  await add('supply-types', supplyType(types.supply));
  return types;
}

/** Makes a project as an engineer, with catalogue types of its own unless given. */
export async function buildProject(engineer: Agent, name = 'Gallery conveyors', given?: TestTypes): Promise<TestProject> {
  const types = given ?? (await buildTypes(engineer));
  const id = newId();
  await engineer.post('/api/v1/projects').send({ id, name }).expect(201);
  const url = `/api/v1/projects/${id}`;
  const ids = {
    cabinet: newId(), controller: newId(), outputs: newId(), inputs: newId(), supply: newId(), circuit: newId(), box: newId(), farBox: newId(),
    pointA: newId(), pointB: newId(), dispenserA: newId(), dispenserB: newId(), assignment: newId(),
  };
  const create = (collection: string, rowId: string, values: object) => ({ collection, op: 'create', id: rowId, values });
  const box = { circuitId: ids.circuit, lengthM: 40, powerMm2: 2.5, signalMm2: 1 };
  const dispenser = { typeId: types.dispenser, wiring: 'four-core', circuitId: ids.circuit, nodeId: ids.box, controllerId: ids.controller };
  const changes = [
    create('assignments', ids.assignment, { dispenserId: ids.dispenserA, moduleId: ids.outputs, channel: 0, purpose: 'control' }),
    create('cabinets', ids.cabinet, { location: '+GC1' }),
    create('controllers', ids.controller, { cabinetId: ids.cabinet, name: 'PLC1' }),
    create('modules', ids.outputs, { controllerId: ids.controller, typeId: types.output, name: 'DO1', baseByte: 4, slot: 1 }),
    create('modules', ids.inputs, { controllerId: ids.controller, typeId: types.input, name: 'DI1', baseByte: 0, slot: 2 }),
    create('supplies', ids.supply, { cabinetId: ids.cabinet, typeId: types.supply, name: '-T1', setV: 24 }),
    create('circuits', ids.circuit, { supplyId: ids.supply, name: '-F1', protection: 'breaker-C', protectionA: 6 }),
    create('cableNodes', ids.box, { ...box, location: '+JB1', cableTag: 'W1' }),
    create('cableNodes', ids.farBox, { ...box, parentId: ids.box, location: '+JB2', cableTag: 'W2' }),
    create('points', ids.pointA, { tag: 'GC1-L01' }),
    create('points', ids.pointB, { tag: 'GC1-L02' }),
    create('dispensers', ids.dispenserA, { ...dispenser, pointId: ids.pointA }),
    create('dispensers', ids.dispenserB, { ...dispenser, pointId: ids.pointB }),
  ];
  await engineer.post(`${url}/change-sets`).send({ id: newId(), summary: 'Set up', changes }).expect(200);
  return { id, url, ids, types };
}
