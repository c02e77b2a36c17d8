import type { Assessment, Design, Module } from '#calc';
import { hardwareOf, type Hardware, type Lane } from './io-rows.ts';
import { naturalCompare } from './order.ts';

/** What the first page of the I/O list says beside the table. */
export interface IoSummary {
  readonly counts: readonly { readonly name: string; readonly value: number }[];
  readonly modules: readonly ModuleLine[];
  readonly findings: { readonly errors: number; readonly warnings: number; readonly notes: number };
}

/** Channels of a module, with those that are free. */
export interface ModuleLine {
  readonly cabinet: string;
  readonly controller: string;
  readonly module: string;
  readonly type: string;
  readonly kind: 'output' | 'input';
  readonly channels: number;
  readonly used: number;
  readonly free: number;
  /** Counted from 0, `8–15`; empty: none is free. */
  readonly freeChannels: string;
}

/** Counts, spare channels of each module and the number of findings. */
export function ioSummary(design: Design, assessment: Assessment, lanes: readonly Lane[]): IoSummary {
  const count = (name: string, holds: (lane: Lane) => unknown) => ({ name, value: lanes.filter(holds).length });
  const found = (severity: string) => assessment.findings.filter((each) => each.severity === severity).length;
  return {
    counts: [
      { name: 'Points', value: lanes.length },
      count('Dispensers', ({ dispenser }) => dispenser),
      count('Control outputs mapped', ({ output }) => output),
      count('Status inputs mapped', ({ status }) => status),
      count('Dispensers without a control output', ({ dispenser, output }) => dispenser?.method === 'pulse' && !output),
    ],
    modules: moduleLines(design),
    findings: { errors: found('error'), warnings: found('warning'), notes: found('note') },
  };
}

function moduleLines(design: Design): ModuleLine[] {
  const hardware = hardwareOf(design);
  const usedOf = new Map<string, Set<number>>(design.modules.map((each) => [each.id, new Set()]));
  for (const { moduleId, channel } of design.assignments) usedOf.get(moduleId)?.add(channel);
  const slots = new Map(design.modules.map((each) => [each.id, each.slot]));
  return design.modules
    .flatMap((each) => {
      const line = moduleLine(each, hardware, usedOf.get(each.id) ?? new Set());
      return line ? [{ line, slot: slots.get(each.id) ?? 0 }] : [];
    })
    .sort((a, b) => naturalCompare(a.line.cabinet, b.line.cabinet) || naturalCompare(a.line.controller, b.line.controller) || a.slot - b.slot)
    .map(({ line }) => line);
}

function moduleLine(module: Module, { cabinets, controllers, moduleTypes }: Hardware, used: ReadonlySet<number>): ModuleLine | null {
  const type = moduleTypes.get(module.typeId);
  const controller = controllers.get(module.controllerId);
  if (!type || !controller) return null;
  const free = Array.from({ length: type.channels }, (_, channel) => channel).filter((channel) => !used.has(channel));
  return {
    cabinet: cabinets.get(controller.cabinetId)?.location ?? '',
    controller: controller.name,
    module: module.name,
    type: type.name,
    kind: type.kind,
    channels: type.channels,
    used: type.channels - free.length,
    free: free.length,
    freeChannels: rangesOf(free),
  };
}

/** `0, 3–5, 8` of ascending numbers. */
export function rangesOf(numbers: readonly number[]): string {
  const ranges: [number, number][] = [];
  for (const each of numbers) {
    const last = ranges.at(-1);
    if (last && last[1] === each - 1) last[1] = each;
    else ranges.push([each, each]);
  }
  return ranges.map(([first, last]) => (first === last ? `${first}` : `${first}–${last}`)).join(', ');
}
