import type { Assignment, Finding, ModuleType } from '#calc';
import type { RackModule } from '../board';

/** A module as the strip draws it: two paths, one for the channels taken, one for those free. */
export interface ModuleMark {
  readonly id: string;
  readonly name: string;
  readonly note: string;
  readonly used: number;
  readonly channels: number;
  readonly width: number;
  readonly taken: string;
  readonly free: string;
  readonly severity: 'error' | 'warning' | null;
}

const CELL_PX = 9;
const GAP_PX = 4;

/** All modules in one pass over assignments and findings. */
export function moduleMarks(modules: readonly RackModule[], assignments: readonly Assignment[], findings: readonly Finding[]): ReadonlyMap<string, ModuleMark> {
  const taken = new Map<string, Set<number>>();
  for (const { moduleId, channel } of assignments) {
    const own = taken.get(moduleId) ?? new Set();
    taken.set(moduleId, own.add(channel));
  }
  const worst = worstByModule(findings);
  return new Map(modules.map(({ module, type }) => {
    const own = taken.get(module.id) ?? new Set<number>();
    const cells = Array.from({ length: type.channels }, (_, channel) => ({ channel, box: box(channel, type) }));
    return [module.id, {
      id: module.id, name: module.name, note: noteOf(type), used: own.size, channels: type.channels, width: left(type.channels - 1, type) + 7,
      taken: cells.filter((c) => own.has(c.channel)).map((c) => c.box).join(''),
      free: cells.filter((c) => !own.has(c.channel)).map((c) => c.box).join(''),
      severity: worst.get(module.id) ?? null,
    }];
  }));
}

const left = (channel: number, type: ModuleType): number => channel * CELL_PX + Math.floor(channel / type.channelsPerGroup) * GAP_PX;
const box = (channel: number, type: ModuleType): string => `M${left(channel, type) + 0.5} .5h6v12h-6z`;
const noteOf = (type: ModuleType): string => (type.kind === 'input' ? 'in' : type.technology === 'relay' ? 'relay' : 'out');

function worstByModule(findings: readonly Finding[]): ReadonlyMap<string, 'error' | 'warning'> {
  const worst = new Map<string, 'error' | 'warning'>();
  for (const { severity, subject } of findings) {
    if (severity === 'note' || (subject.kind !== 'module' && subject.kind !== 'group' && subject.kind !== 'channel')) continue;
    const moduleId = subject.id.split('/')[0];
    if (worst.get(moduleId) !== 'error') worst.set(moduleId, severity);
  }
  return worst;
}
