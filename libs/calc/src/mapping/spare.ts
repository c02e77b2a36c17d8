import type { ModuleType } from '../design.ts';
import { type DesignIndex, grouped } from '../design-index.ts';
import { makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';
import { channelsUsed } from '../hardware/loads.ts';

export type Kind = ModuleType['kind'];

/** Channels of one kind in one cabinet. */
export interface ChannelCount {
  readonly cabinetId: string;
  readonly kind: Kind;
  readonly channels: number;
  readonly used: number;
  /** Channels that the policy keeps free. */
  readonly spare: number;
}

/** Channels that must stay free of so many, rounded up. */
export function spareChannels(channels: number, sparePercent: number): number {
  return Math.ceil((channels * sparePercent) / 100 - 1e-9);
}

/** Counts channels for each cabinet and kind. */
export function channelCounts({ design, controllers, moduleTypes, assignmentsByModule }: DesignIndex): ChannelCount[] {
  const families = grouped(design.modules, (module) => {
    const type = moduleTypes.get(module.typeId);
    const controller = controllers.get(module.controllerId);
    return type && controller ? `${type.kind}/${controller.cabinetId}` : null;
  });
  return [...families].map(([key, modules]) => {
    let channels = 0;
    let used = 0;
    for (const module of modules) {
      channels += moduleTypes.get(module.typeId)!.channels;
      used += channelsUsed(assignmentsByModule.get(module.id) ?? []);
    }
    const kind: Kind = key.startsWith('output/') ? 'output' : 'input';
    return { cabinetId: key.slice(kind.length + 1), kind, channels, used, spare: spareChannels(channels, design.project.sparePercent) };
  });
}

/** Spare-channel policy of each cabinet and kind. */
export function spareFindings(index: DesignIndex): Finding[] {
  const findings: Finding[] = [];
  for (const { cabinetId, kind, channels, used, spare } of channelCounts(index)) {
    const free = channels - used;
    if (free >= spare) continue;
    const label = index.cabinets.get(cabinetId)?.location ?? cabinetId;
    findings.push(makeFinding('SP-01', 'cabinet', cabinetId, label, {
      title: `${Math.max(0, free)} of ${channels} ${kind} channels free, policy ${spare}`,
      detail: `${index.design.project.sparePercent} % of the channels of each kind stay free.`,
      remedy: `Add an ${kind} module in ${label}, or move dispensers to another cabinet.`,
      compared: [{ name: 'free channels', value: free, limit: spare, unit: '' }],
      mark: kind,
    }));
  }
  return findings;
}
