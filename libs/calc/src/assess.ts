import { designFindings, type DesignFindings } from './all-findings.ts';
import type { Assessment, CircuitFigures, LaneFigures, LoadFigures, ModuleFigures, SupplyFigures } from './assessment.ts';
import type { Design } from './design.ts';
import { type DesignIndex, indexDesign } from './design-index.ts';
import { type Electrics, solveElectrics } from './electrics.ts';
import { findingsByLane, sortedFindings } from './finding-order.ts';
import type { Finding } from './findings.ts';
import { type LaneRows, laneRows } from './lane-rows.ts';
import { type LaneStates, laneStates } from './lane-states.ts';
import { type PointPlans, pointPlans } from './point-plans.ts';

/**
 * Every figure and finding of a project from its rows alone: no clock, no chance, no state. Rows that
 * are blank or contradict each other never throw; they become findings.
 */
export function assess(design: Design): Assessment {
  return derive(design, null).assessment;
}

/**
 * Makes a function that gives what `assess` gives, and remembers the design that it saw last: of the next one
 * it derives only what hangs on rows that are other objects than before. For a design that is edited step
 * by step, each step keeping the objects of the rows it does not touch.
 */
export function createAssessor(): (design: Design) => Assessment {
  let last: Derived | null = null;
  return (design) => {
    last = derive(design, last);
    return last.assessment;
  };
}

/** What was derived from a design, stage by stage. */
interface Derived {
  readonly index: DesignIndex;
  readonly rows: LaneRows;
  readonly plans: PointPlans;
  readonly electrics: Electrics;
  readonly lanes: LaneStates;
  readonly whole: DesignFindings;
  readonly assessment: Assessment;
}

function derive(design: Design, previous: Derived | null): Derived {
  const index = indexDesign(design, previous?.index);
  const rows = laneRows(index, previous?.rows ?? null);
  const plans = pointPlans(index, rows, previous?.plans ?? null);
  const electrics = solveElectrics(index, rows, previous?.electrics ?? null);
  const lanes = laneStates(rows, plans, electrics, previous?.lanes ?? null);
  const whole = designFindings(index, previous?.whole ?? null);
  const findings = sortedFindings(findingLists(plans, electrics, lanes, whole));
  const assessment: Assessment = {
    points: plans.figures,
    lanes: laneMap(rows, lanes),
    ...moduleMaps(electrics),
    ...circuitMaps(electrics),
    findings,
    findingsByLane: findingsByLane(findings),
  };
  return { index, rows, plans, electrics, lanes, whole, assessment };
}

function findingLists(plans: PointPlans, electrics: Electrics, lanes: LaneStates, whole: DesignFindings): (readonly Finding[])[] {
  const lists: (readonly Finding[])[] = [];
  for (const { findings } of plans.bare.values()) lists.push(findings);
  for (const { findings } of electrics.supplies.values()) lists.push(findings);
  for (const { mappingFindings, loadFindings } of electrics.modules.values()) lists.push(mappingFindings, loadFindings);
  lists.push(...whole.findings);
  for (const { findings } of lanes.states) if (findings.length > 0) lists.push(findings);
  return lists;
}

function laneMap({ lanes }: LaneRows, { states }: LaneStates): Map<string, LaneFigures> {
  const map = new Map<string, LaneFigures>();
  lanes.forEach(({ dispenser }, i) => map.set(dispenser.id, states[i].figures));
  return map;
}

function moduleMaps({ modules }: Electrics): Pick<Assessment, 'groups' | 'modules'> {
  const maps = { groups: new Map<string, LoadFigures>(), modules: new Map<string, ModuleFigures>() };
  for (const [id, { loads, groupKeys }] of modules) {
    loads.groups.forEach((figures, g) => maps.groups.set(groupKeys[g], figures));
    maps.modules.set(id, loads.module);
  }
  return maps;
}

function circuitMaps({ supplies, circuits }: Electrics): Pick<Assessment, 'circuits' | 'supplies'> {
  const maps = { circuits: new Map<string, CircuitFigures>(), supplies: new Map<string, SupplyFigures>() };
  for (const [id, { context }] of supplies) maps.supplies.set(id, context.figures);
  for (const [id, { figures }] of circuits) maps.circuits.set(id, figures);
  return maps;
}
