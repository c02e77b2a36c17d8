import { type Assessment, directAddress, type Finding, groupKey, type LoadFigures, type Module, type ModuleType, type Purpose } from '#calc';
import type { LaneView } from '../shared/lane/lane-view';
import { type Board, channelKey, type Occupant, type RackModule } from './board';

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
  /** The drawing of what is on it. */
  readonly lane: LaneView | null;
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

/** A channel that auto-assignment, a filling or a drop would give to a dispenser. */
export interface Proposal {
  readonly dispenserId: string;
  readonly moduleId: string;
  readonly channel: number;
  readonly purpose: Purpose;
}

export type Shown = 'output' | 'input' | 'both';

export interface SectionSource {
  readonly board: Board;
  readonly assessment: Assessment;
  readonly lanes: ReadonlyMap<string, LaneView>;
  readonly shown: Shown;
  readonly proposals: readonly Proposal[];
}

/**
 * The channel table: the groups of every module shown, in order of cabinet, controller and place on the rack. What reads
 * the same as before is the same object as before, so that only what changed is drawn again.
 */
export function mappingSections(source: SectionSource, before: readonly GroupSection[] = []): readonly GroupSection[] {
  const context: Context = {
    ...source, findings: bySubject(source.assessment.findings), before: new Map(before.map((s) => [s.key, s])),
    proposed: new Map(source.proposals.map((p) => [channelKey(p.moduleId, p.channel), p])),
  };
  return source.board.modules
    .filter(({ type }) => source.shown === 'both' || type.kind === source.shown)
    .flatMap((rack) => groupsOf(rack.type).map((groupIndex) => groupSection(context, rack, groupIndex)));
}

interface Context extends SectionSource {
  readonly findings: ReadonlyMap<string, readonly Finding[]>;
  readonly proposed: ReadonlyMap<string, Proposal>;
  readonly before: ReadonlyMap<string, GroupSection>;
}

export const groupsOf = (type: ModuleType): readonly number[] =>
  Array.from({ length: Math.ceil(type.channels / type.channelsPerGroup) }, (_, i) => i);

function groupSection(context: Context, { module, type, controller }: RackModule, groupIndex: number): GroupSection {
  const from = groupIndex * type.channelsPerGroup;
  const to = Math.min(from + type.channelsPerGroup, type.channels) - 1;
  const key = groupKey(module.id, groupIndex);
  const old = context.before.get(key);
  // The same module of the same type has the same keys and addresses: they need not be written again.
  const rows = old?.module === module && old.type === type ? old.channels : [];
  const channels = Array.from({ length: to - from + 1 }, (_, i) => channelRow(context, module, type, from + i, rows[i]));
  const feed = context.board.feeds.get(key);
  const findings = [...(context.findings.get(key) ?? []), ...((groupIndex === 0 && context.findings.get(module.id)) || [])];
  return kept({
    key, controller: controller.name, module, type, groupIndex,
    channels: sameList(channels, old?.channels) ? old.channels : channels,
    first: channels[0].address, last: channels[channels.length - 1].address,
    circuit: (feed && context.board.circuits.get(feed)) ?? null,
    load: keptLoad(context.assessment.groups.get(key) ?? null, old?.load),
    free: channels.filter((c) => !c.occupant || c.proposed).length,
    findings: keptFindings(findings, old?.findings),
  }, old);
}

function channelRow(context: Context, module: Module, type: ModuleType, channel: number, old: ChannelRow | undefined): ChannelRow {
  const { board, assessment } = context;
  const key = old?.key ?? channelKey(module.id, channel);
  const taken = board.taken.get(key);
  const proposal = taken ? undefined : context.proposed.get(key);
  const dispenserId = taken?.dispenserId ?? proposal?.dispenserId;
  if (dispenserId === undefined && old && !old.occupant) return old;
  const figures = dispenserId === undefined ? undefined : assessment.lanes.get(dispenserId);
  const isOutput = type.kind === 'output';
  return kept({
    key, module, channel,
    purpose: isOutput ? 'control' : 'status',
    address: old?.address ?? directAddress(type.kind, module.baseByte, channel),
    occupant: (dispenserId !== undefined && board.occupants.get(dispenserId)) || null,
    proposed: proposal !== undefined,
    otherAddress: (isOutput ? figures?.statusAddress : figures?.outputAddress) ?? null,
    loadA: isOutput ? (figures?.channelA ?? null) : type.inputA,
    lane: (dispenserId !== undefined && context.lanes.get(dispenserId)) || null,
  }, old);
}

/** What concerns a place, notes aside, by the place's id. */
function bySubject(findings: readonly Finding[]): ReadonlyMap<string, readonly Finding[]> {
  const found = new Map<string, Finding[]>();
  for (const finding of findings) {
    if (finding.severity === 'note' || finding.subject.kind === 'dispenser' || finding.subject.kind === 'point') continue;
    const own = found.get(finding.subject.id);
    if (own) own.push(finding);
    else found.set(finding.subject.id, [finding]);
  }
  return found;
}

/** The old object where every field is the same. */
export function kept<T extends object>(made: T, old: T | undefined): T {
  if (!old) return made;
  for (const field in made) if (made[field] !== old[field]) return made;
  return old;
}

function sameList<T>(made: readonly T[], old: readonly T[] | undefined): old is readonly T[] {
  return old !== undefined && made.length === old.length && made.every((item, i) => item === old[i]);
}

function keptLoad(made: LoadFigures | null, old: LoadFigures | null | undefined): LoadFigures | null {
  if (!made || !old) return made;
  return made.worstA === old.worstA && made.allOnA === old.allOnA && made.ratingA === old.ratingA && made.used === old.used ? old : made;
}

function keptFindings(made: readonly Finding[], old: readonly Finding[] | undefined): readonly Finding[] {
  const same = old?.length === made.length && made.every((f, i) => {
    const o = old[i];
    return f === o || (f.key === o.key && f.severity === o.severity && f.title === o.title && f.detail === o.detail && f.remedy === o.remedy);
  });
  return same ? old : made;
}
