import {
  type Assessment, type Cabinet, type Controller, type Design, directAddress, groupKey, type LoadFigures, type Module, type ModuleFigures,
  type ModuleGroup, type ModuleType,
} from '#calc';

export interface GroupView {
  readonly key: string;
  /** Not there for a moment, while the server makes it. */
  readonly group: ModuleGroup | null;
  readonly index: number;
  readonly first: string;
  readonly last: string;
  readonly load: LoadFigures | null;
}

export interface ModuleView {
  readonly module: Module;
  readonly type: ModuleType;
  readonly first: string;
  readonly last: string;
  readonly figures: ModuleFigures | null;
  readonly used: number;
  /** Of an output module. */
  readonly groups: readonly GroupView[];
}

export interface ControllerView {
  readonly controller: Controller;
  readonly modules: readonly ModuleView[];
}

export interface CabinetView {
  readonly cabinet: Cabinet;
  readonly controllers: readonly ControllerView[];
}

/** Cabinets by location, each with its controllers by name and their modules from the left. */
export function cabinetViews(design: Design, assessment: Assessment): readonly CabinetView[] {
  const types = new Map(design.moduleTypes.map((type) => [type.id, type]));
  const moduleViews = (controllerId: string): readonly ModuleView[] =>
    design.modules.filter((m) => m.controllerId === controllerId).sort((a, b) => a.slot - b.slot).flatMap((module) => {
      const type = types.get(module.typeId);
      return type ? [moduleView(design, assessment, module, type)] : [];
    });
  return [...design.cabinets].sort(by((c) => c.location)).map((cabinet) => ({
    cabinet,
    controllers: design.controllers.filter((c) => c.cabinetId === cabinet.id).sort(by((c) => c.name))
      .map((controller) => ({ controller, modules: moduleViews(controller.id) })),
  }));
}

function moduleView(design: Design, assessment: Assessment, module: Module, type: ModuleType): ModuleView {
  const groups = type.kind === 'output' ? Array.from({ length: Math.ceil(type.channels / type.channelsPerGroup) }, (_, i) => i) : [];
  return {
    module, type,
    first: directAddress(type.kind, module.baseByte, 0), last: directAddress(type.kind, module.baseByte, type.channels - 1),
    figures: assessment.modules.get(module.id) ?? null,
    used: new Set(design.assignments.filter((a) => a.moduleId === module.id).map((a) => a.channel)).size,
    groups: groups.map((index) => groupView(design, assessment, module, type, index)),
  };
}

function groupView(design: Design, assessment: Assessment, module: Module, type: ModuleType, index: number): GroupView {
  const from = index * type.channelsPerGroup;
  const key = groupKey(module.id, index);
  return {
    key, index,
    group: design.moduleGroups.find((g) => g.moduleId === module.id && g.groupIndex === index) ?? null,
    first: directAddress(type.kind, module.baseByte, from),
    last: directAddress(type.kind, module.baseByte, Math.min(from + type.channelsPerGroup, type.channels) - 1),
    load: assessment.groups.get(key) ?? null,
  };
}

/** Order of designations: `DO2` before `DO10`. */
export const by = <T>(name: (row: T) => string) => (a: T, b: T): number => name(a).localeCompare(name(b), 'en', { numeric: true });
