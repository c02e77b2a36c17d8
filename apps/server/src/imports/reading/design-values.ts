import type { Assignment, Dispenser, Point } from '#calc';
import { addressOf, type DesignIndex } from './design-index.ts';
import { blankValues } from './import-values.ts';
import type { DraftValues, ImportValues } from './plan.ts';

/** What a design says of a point, in the words of an import. */
export function valuesOfPoint(point: Point, index: DesignIndex): ImportValues {
  const values = blankValues();
  putPoint(values, point, index);
  const dispenser = index.dispenserByPoint.get(point.id);
  if (dispenser) putDispenser(values, dispenser, index);
  return values;
}

function putPoint(values: DraftValues, point: Point, index: DesignIndex): void {
  const per100h = demandPer100h(point);
  values.tag = point.tag;
  values.description = point.description;
  values.function = point.function;
  values.location = point.location;
  values.product = point.product;
  values.machine = point.machine;
  values.remarks = point.remarks;
  values.boreMm = point.boreMm;
  values.outsideMm = point.outsideMm;
  values.widthMm = point.widthMm;
  values.speedRpm = point.speedRpm;
  values.hoursPerDay = point.hoursPerDay;
  values.daysPerWeek = point.daysPerWeek;
  values.demandUlPer100h = per100h;
  values.demandUlPer1000h = per100h === null ? null : point.statedPer === '1000h' ? point.statedUl : per100h * 10;
  values.grease = (point.greaseId && index.greaseById.get(point.greaseId)?.name) ?? null;
}

function putDispenser(values: DraftValues, dispenser: Dispenser, index: DesignIndex): void {
  const { typeId, controllerId, circuitId, nodeId } = dispenser;
  values.cartridgeUl = dispenser.cartridgeUl;
  values.doseUl = dispenser.doseUl;
  values.wiring = dispenser.wiring;
  values.cableTag = dispenser.cableTag;
  values.cableLengthM = dispenser.cableLengthM;
  values.crossSectionMm2 = dispenser.crossSectionMm2;
  values.dispenserType = (typeId && index.typeById.get(typeId)?.name) ?? null;
  values.circuit = (circuitId && index.circuitById.get(circuitId)?.name) ?? null;
  values.junctionBox = (nodeId && index.boxById.get(nodeId)?.location) ?? null;
  const output = index.assignmentOf(dispenser, 'control');
  const status = index.assignmentOf(dispenser, 'status');
  values.controller = controllerName(output ?? status, controllerId, index);
  putChannels(values, output, status, index);
}

/** Where its channels are goes before where it belongs, as in our own lists: addresses are the controller's own. */
function controllerName(mapped: Assignment | undefined, belongsTo: string | null, index: DesignIndex): string | null {
  const id = (mapped && index.moduleById.get(mapped.moduleId)?.controllerId) ?? belongsTo;
  return (id !== null && index.controllerById.get(id)?.name) || null;
}

function putChannels(values: DraftValues, output: Assignment | undefined, status: Assignment | undefined, index: DesignIndex): void {
  const outputModule = output && index.moduleById.get(output.moduleId);
  if (outputModule) {
    values.outputModule = outputModule.name;
    values.outputChannel = output.channel;
    values.outputAddress = addressOf(outputModule, output.channel);
  }
  const statusModule = status && index.moduleById.get(status.moduleId);
  if (statusModule) {
    values.statusModule = statusModule.name;
    values.statusChannel = status.channel;
    values.statusAddress = addressOf(statusModule, status.channel);
  }
}

function demandPer100h({ statedUl, statedPer }: Point): number | null {
  if (statedUl === null) return null;
  if (statedPer === '100h') return statedUl;
  return statedPer === '1000h' ? statedUl / 10 : null;
}
