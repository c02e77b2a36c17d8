import {
  type Assessment, type Assignment, type Controller, type Design, directAddress, type Dispenser, type Finding, groupKey,
  type LoadFigures, type Module, type ModuleType, type Point, type Purpose,
} from '#calc';

/** A channel with what is on it, or what is proposed for it. */
export interface ChannelRow {
  readonly key: string;
  readonly module: Module;
  readonly channel: number;
  readonly purpose: Purpose;
  readonly address: string;
  readonly occupant: Occupant | null;
  readonly proposed: boolean;
  /** Address of the dispenser's other signal. */
  readonly otherAddress: string | null;
  readonly loadA: number | null;
}

export interface Occupant {
  readonly dispenser: Dispenser;
  readonly point: Point;
}

/** A group of a module with its feed, its worst load, what the checks found on it, and its channels. */
export interface GroupSection {
  readonly key: string;
  /** Modules of different controllers may have the same name. */
  readonly controller: string;
  readonly module: Module;
  readonly type: ModuleType;
  readonly groupIndex: number;
  readonly first: string;
  readonly last: string;
  readonly circuit: string | null;
  readonly load: LoadFigures | null;
  readonly free: number;
  readonly findings: readonly Finding[];
  readonly channels: readonly ChannelRow[];
}

/** A channel that auto-assignment would give to a dispenser. */
export interface Proposal {
  readonly dispenserId: string;
  readonly moduleId: string;
  readonly channel: number;
  readonly purpose: Purpose;
}

export interface CabinetModules {
  readonly cabinet: Design['cabinets'][number];
  readonly modules: readonly { readonly module: Module; readonly type: ModuleType; readonly controller: Controller }[];
}

export const channelKey = (moduleId: string, channel: number): string => `${moduleId}:${channel}`;

/** Cabinets in order of their location, each with its modules from the left. */
export function modulesByCabinet(design: Design): readonly CabinetModules[] {
  const types = new Map(design.moduleTypes.map((t) => [t.id, t]));
  return [...design.cabinets].sort((a, b) => a.location.localeCompare(b.location)).map((cabinet) => ({
    cabinet,
    modules: design.controllers.filter((c) => c.cabinetId === cabinet.id).sort((a, b) => a.name.localeCompare(b.name))
      .flatMap((controller) => design.modules.filter((m) => m.controllerId === controller.id).sort((a, b) => a.slot - b.slot)
        .flatMap((module) => {
          const type = types.get(module.typeId);
          return type ? [{ module, type, controller }] : [];
        })),
  }));
}

/** The channel table: the groups of every module shown, in order of cabinet, controller and place on the rack. */
export function mappingSections(
  design: Design, assessment: Assessment, shown: 'output' | 'input' | 'both', proposals: readonly Proposal[],
): readonly GroupSection[] {
  const context = contextOf(design, assessment, proposals);
  return modulesByCabinet(design).flatMap(({ modules }) => modules)
    .filter(({ type }) => shown === 'both' || type.kind === shown)
    .flatMap(({ module, type, controller }) => groupsOf(type).map((groupIndex) => groupSection(context, module, type, groupIndex, controller.name)));
}

interface Context {
  readonly design: Design;
  readonly assessment: Assessment;
  readonly taken: ReadonlyMap<string, Assignment>;
  readonly proposed: ReadonlyMap<string, Proposal>;
  readonly occupants: ReadonlyMap<string, Occupant>;
  readonly circuits: ReadonlyMap<string, string>;
}

function contextOf(design: Design, assessment: Assessment, proposals: readonly Proposal[]): Context {
  const points = new Map(design.points.map((p) => [p.id, p]));
  const occupants = new Map<string, Occupant>();
  for (const dispenser of design.dispensers) {
    const point = points.get(dispenser.pointId);
    if (point) occupants.set(dispenser.id, { dispenser, point });
  }
  return {
    design, assessment, occupants,
    taken: new Map(design.assignments.map((a) => [channelKey(a.moduleId, a.channel), a])),
    proposed: new Map(proposals.map((p) => [channelKey(p.moduleId, p.channel), p])),
    circuits: new Map(design.circuits.map((c) => [c.id, c.name])),
  };
}

const groupsOf = (type: ModuleType): readonly number[] =>
  Array.from({ length: Math.ceil(type.channels / type.channelsPerGroup) }, (_, i) => i);

function groupSection(context: Context, module: Module, type: ModuleType, groupIndex: number, controller: string): GroupSection {
  const from = groupIndex * type.channelsPerGroup;
  const to = Math.min(from + type.channelsPerGroup, type.channels) - 1;
  const channels = Array.from({ length: to - from + 1 }, (_, i) => channelRow(context, module, type, from + i));
  const key = groupKey(module.id, groupIndex);
  const feed = context.design.moduleGroups.find((g) => g.moduleId === module.id && g.groupIndex === groupIndex)?.circuitId;
  return {
    key, controller, module, type, groupIndex, channels,
    first: directAddress(type.kind, module.baseByte, from), last: directAddress(type.kind, module.baseByte, to),
    circuit: (feed && context.circuits.get(feed)) ?? null,
    load: context.assessment.groups.get(key) ?? null,
    free: channels.filter((c) => !c.occupant || c.proposed).length,
    findings: context.assessment.findings
      .filter((f) => f.severity !== 'note' && (f.subject.id === key || (groupIndex === 0 && f.subject.id === module.id))),
  };
}

function channelRow(context: Context, module: Module, type: ModuleType, channel: number): ChannelRow {
  const key = channelKey(module.id, channel);
  const taken = context.taken.get(key);
  const proposal = taken ? undefined : context.proposed.get(key);
  const dispenserId = taken?.dispenserId ?? proposal?.dispenserId;
  const lane = dispenserId === undefined ? undefined : context.assessment.lanes.get(dispenserId);
  const isOutput = type.kind === 'output';
  return {
    key, module, channel,
    purpose: isOutput ? 'control' : 'status',
    address: directAddress(type.kind, module.baseByte, channel),
    occupant: (dispenserId !== undefined && context.occupants.get(dispenserId)) || null,
    proposed: proposal !== undefined,
    otherAddress: (isOutput ? lane?.statusAddress : lane?.outputAddress) ?? null,
    loadA: isOutput ? (lane?.channelA ?? null) : type.inputA,
  };
}
