import type { Cabinet, CableNode, Circuit, Controller, Design, ModuleType, Supply } from '#calc';
import { nameOf, type Read, type Typed } from '../shared/fields/typed';
import { typeChoices } from '../shared/fields/type-choices';
import { choiceField, type NewField, type NewRow, type Values } from './add-row/new-row';
import { nextFreeByte, nextName, nextSlot } from './rack';
import { PROTECTIONS, READ, sectionsWith } from './readers';

export function newCabinet(design: Design): NewRow {
  const taken = design.cabinets.map((c) => c.location);
  return {
    collection: 'cabinets', title: 'Add a cabinet', fixed: {},
    fields: [
      name('location', 'Location', taken, '+K1'),
      text('temperatureC', 'Temperature inside', '40', READ.temperature, '°C'),
      text('description', 'Description', '', READ.description),
    ],
  };
}

export function newController(design: Design, cabinet: Cabinet): NewRow {
  return {
    collection: 'controllers', title: `Add a controller in ${cabinet.location}`, fixed: { cabinetId: cabinet.id },
    fields: [name('name', 'Name', design.controllers.map((c) => c.name), 'PLC1')],
  };
}

/** The name and the base byte suggested follow the type chosen: outputs and inputs count apart. */
export function newModule(design: Design, controller: Controller): NewRow {
  const own = design.modules.filter((m) => m.controllerId === controller.id);
  const types = new Map(design.moduleTypes.map((type) => [type.id, type]));
  const ofType = (suggest: (type: ModuleType) => string) => (values: Values) => {
    const type = types.get(values['typeId'] ?? '');
    return type ? suggest(type) : '';
  };
  const namesLike = ({ technology }: ModuleType) => own.filter((m) => types.get(m.typeId)?.technology === technology).map((m) => m.name);
  return {
    collection: 'modules', title: `Add a module to ${controller.name}`,
    fixed: { controllerId: controller.id, slot: nextSlot(design.modules, controller.id) },
    fields: [
      choiceField('typeId', 'Type', typeChoices(design.moduleTypes)),
      { ...name('name', 'Name', own.map((m) => m.name), ''), suggest: ofType((type) => nextName(namesLike(type), FIRST_NAME[type.technology])) },
      { field: 'baseByte', label: 'Base byte', read: READ.baseByte, suggest: ofType((type) => String(nextFreeByte(design, controller.id, type.kind))) },
    ],
  };
}

const FIRST_NAME: Readonly<Record<ModuleType['technology'], string>> = { transistor: 'DO1', relay: 'RO1', input: 'DI1' };

export function newSupply(design: Design): NewRow {
  return {
    collection: 'supplies', title: 'Add a supply', fixed: {},
    fields: [
      choiceField('cabinetId', 'Cabinet', design.cabinets.map((c) => ({ value: c.id, label: c.location }))),
      choiceField('typeId', 'Type', typeChoices(design.supplyTypes)),
      text('name', 'Name', nextName(design.supplies.map((s) => s.name), '-T1'), READ.name),
      text('setV', 'Voltage set', '24', READ.setV, 'V'),
      text('internalOhm', 'Resistance up to the terminals', '0', READ.ohm, 'Ω'),
      text('otherLoadA', 'Other load', '0', READ.otherLoadA, 'A'),
    ],
  };
}

export function newCircuit(design: Design, supply: Supply): NewRow {
  return {
    collection: 'circuits', title: `Add a circuit on ${supply.name}`, fixed: { supplyId: supply.id },
    fields: [
      name('name', 'Name', design.circuits.map((c) => c.name), 'C1'),
      choiceField('protection', 'Protection', PROTECTIONS),
      text('protectionA', 'Rating', '', READ.protectionA, 'A'),
      text('concurrencyLimit', 'At most at once, k (blank: all)', '', READ.limit),
    ],
  };
}

/** A box behind another, or at the cabinet's terminals (null); it begins with the sections of the trunk before it. */
export function newBox(design: Design, circuit: Circuit, parent: CableNode | null): NewRow {
  const boxes = design.cableNodes.filter((node) => node.circuitId === circuit.id);
  const like = parent ?? boxes.at(-1);
  return {
    collection: 'cableNodes', title: parent ? `Add a box behind ${parent.location}` : `Add a box at the cabinet, ${circuit.name}`,
    fixed: { circuitId: circuit.id, parentId: parent?.id ?? null },
    fields: [
      name('location', 'Location', design.cableNodes.map((node) => node.location), '+JB1'),
      name('cableTag', 'Cable', design.cableNodes.map((node) => node.cableTag), '-W1'),
      text('lengthM', 'Length', '', READ.lengthM, 'm'),
      section('powerMm2', 'Power pair, mm²', like?.powerMm2 ?? 2.5),
      section('signalMm2', 'Signal cores, mm²', like?.signalMm2 ?? 1),
    ],
  };
}

const text = (field: string, label: string, first: string, read: Read<unknown>, unit?: string): NewField => ({ field, label, read, unit, suggest: () => first });

/** A name that nothing else of its kind has, the next of the row suggested. */
function name(field: string, label: string, taken: readonly string[], first: string): NewField {
  const read = (typed: string): Typed<string> => {
    const answer = nameOf()(typed);
    return answer.ok && taken.includes(answer.value) ? { ok: false, reason: `${answer.value} is taken already.` } : answer;
  };
  return { field, label, read, suggest: () => nextName(taken, first) };
}

/** A standard cross-section; sent as a number. */
function section(field: string, label: string, first: number): NewField {
  const choices = sectionsWith(first).map(({ value, label: shown }) => ({ value: String(value), label: shown }));
  const chosen = choiceField(field, label, choices, String(first));
  return { ...chosen, read: (typed) => { const answer = chosen.read(typed); return answer.ok ? { ok: true, value: Number(answer.value) } : answer; } };
}
