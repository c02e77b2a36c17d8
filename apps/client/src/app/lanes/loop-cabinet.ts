import type { Assessment, Design, Module, ModuleType } from '#calc';
import type { LoopChannel, LoopSupply } from '../shared/lane/loop-view';
import { type LaneRows, protectionText } from './lane-rows';

/** Supply and protection of the lane's circuit, with its worst load against its rating. */
export function supplyOf(design: Design, assessment: Assessment, { circuit, dispenser }: LaneRows): LoopSupply {
  const supply = design.supplies.find((s) => s.id === circuit?.supplyId);
  const controller = design.controllers.find((c) => c.id === dispenser.controllerId);
  const cabinet = design.cabinets.find((c) => c.id === (supply?.cabinetId ?? controller?.cabinetId));
  const load = circuit ? assessment.circuits.get(circuit.id) : undefined;
  return {
    cabinet: cabinet?.location ?? 'no cabinet',
    name: supply?.name ?? null, setV: supply?.setV ?? null,
    extraLowVoltage: design.supplyTypes.find((t) => t.id === supply?.typeId)?.extraLowVoltage ?? null,
    circuit: circuit?.name ?? null, protection: circuit && protectionText(circuit),
    worstA: load?.worstA ?? null, ratingA: load?.ratingA ?? null,
  };
}

/** The channel on which a signal of the lane stands; null while it is open. */
export function channelOf(design: Design, { dispenser, figures }: LaneRows, purpose: 'control' | 'status'): LoopChannel | null {
  const assignment = design.assignments.find((a) => a.dispenserId === dispenser.id && a.purpose === purpose);
  const module = design.modules.find((m) => m.id === assignment?.moduleId);
  const address = purpose === 'control' ? figures?.outputAddress : figures?.statusAddress;
  if (!assignment || !module || !address) return null;
  const type = typeOf(design, module);
  const control = purpose === 'control';
  return {
    module: module.name, channel: assignment.channel, address,
    amps: control ? (figures?.channelA ?? null) : (type?.inputA ?? null), ratingA: control ? (type?.channelA ?? null) : null,
  };
}

const typeOf = (design: Design, module: Module): ModuleType | undefined => design.moduleTypes.find((t) => t.id === module.typeId);
