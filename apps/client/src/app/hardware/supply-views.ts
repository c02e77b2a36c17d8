import type { Assessment, Circuit, CircuitFigures, Design, Supply, SupplyFigures, SupplyType } from '#calc';
import type { Choice } from '../shared/fields/choice';
import { typeChoices } from '../shared/fields/type-choices';
import { by } from './cabinet-views';
import { treeRows, type TreeRow } from './cable-tree';

export interface CircuitView {
  readonly circuit: Circuit;
  readonly figures: CircuitFigures | null;
  /** Tags of the dispensers with the lowest voltage and with the smallest short-circuit current. */
  readonly lowestAt: string | null;
  readonly shortCircuitAt: string | null;
}

export interface SupplyView {
  readonly supply: Supply;
  readonly type: SupplyType | null;
  /** Types that it may become, its own among them. */
  readonly typeChoices: readonly Choice<string>[];
  readonly cabinet: string;
  readonly figures: SupplyFigures | null;
  readonly circuits: readonly CircuitView[];
}

/** A dispenser that hangs on a box or at the cabinet, by its point's tag. */
export interface HungDispenser {
  readonly id: string;
  readonly tag: string;
}

export interface TreeView {
  readonly circuit: Circuit;
  /** Location of the cabinet whose terminals the circuit leaves. */
  readonly cabinet: string;
  readonly atCabinet: readonly HungDispenser[];
  readonly rows: readonly TreeRow[];
  readonly atNode: ReadonlyMap<string, readonly HungDispenser[]>;
}

/** Supplies by cabinet and name, each with its circuits. */
export function supplyViews(design: Design, assessment: Assessment): readonly SupplyView[] {
  const tags = tagsOf(design);
  return suppliesInOrder(design).map(({ supply, cabinet }) => ({
    supply, cabinet,
    type: design.supplyTypes.find((type) => type.id === supply.typeId) ?? null,
    typeChoices: typeChoices(design.supplyTypes, supply.typeId),
    figures: assessment.supplies.get(supply.id) ?? null,
    circuits: circuitsOf(design, supply).map((circuit) => {
      const figures = assessment.circuits.get(circuit.id) ?? null;
      return { circuit, figures, lowestAt: tags.get(figures?.lowestAt ?? '') ?? null, shortCircuitAt: tags.get(figures?.shortCircuitAt ?? '') ?? null };
    }),
  }));
}

/** The cable tree of every circuit, with the dispensers that hang on its boxes. */
export function treeViews(design: Design): readonly TreeView[] {
  const tags = tagsOf(design);
  const hung = (belongs: (d: Design['dispensers'][number]) => boolean): readonly HungDispenser[] =>
    design.dispensers.filter(belongs).map((d) => ({ id: d.id, tag: tags.get(d.id) ?? '' })).sort(by((d) => d.tag));
  return suppliesInOrder(design).flatMap(({ supply, cabinet }) => circuitsOf(design, supply).map((circuit) => {
    const rows = treeRows(design.cableNodes.filter((node) => node.circuitId === circuit.id));
    return {
      circuit, cabinet, rows,
      atCabinet: hung((d) => d.circuitId === circuit.id && d.nodeId === null),
      atNode: new Map(rows.map(({ node }) => [node.id, hung((d) => d.nodeId === node.id)])),
    };
  }));
}

function suppliesInOrder(design: Design): readonly { readonly supply: Supply; readonly cabinet: string }[] {
  const locations = new Map(design.cabinets.map((cabinet) => [cabinet.id, cabinet.location]));
  return design.supplies.map((supply) => ({ supply, cabinet: locations.get(supply.cabinetId) ?? '' })).sort(by((s) => `${s.cabinet} ${s.supply.name}`));
}

const circuitsOf = (design: Design, supply: Supply): readonly Circuit[] =>
  design.circuits.filter((circuit) => circuit.supplyId === supply.id).sort(by((circuit) => circuit.name));

function tagsOf(design: Design): ReadonlyMap<string, string> {
  const points = new Map(design.points.map((point) => [point.id, point.tag]));
  return new Map(design.dispensers.map((d) => [d.id, points.get(d.pointId) ?? '']));
}
