import type { Design, Module, ModuleType } from '#calc';

/** Bytes that a module's addresses take. */
const bytesOf = (type: ModuleType | undefined): number => Math.max(1, Math.ceil((type?.channels ?? 1) / 8));

/**
 * The first byte behind every module of the same kind on a controller: outputs and inputs count apart,
 * and a gap that was left between two modules stays free.
 */
export function nextFreeByte(design: Design, controllerId: string, kind: ModuleType['kind']): number {
  const types = new Map(design.moduleTypes.map((type) => [type.id, type]));
  return design.modules
    .filter((module) => module.controllerId === controllerId && types.get(module.typeId)?.kind === kind)
    .reduce((free, module) => Math.max(free, module.baseByte + bytesOf(types.get(module.typeId))), 0);
}

/** The place behind the last module on a controller's rack. */
export function nextSlot(modules: readonly Module[], controllerId: string): number {
  return modules.filter((module) => module.controllerId === controllerId).reduce((next, module) => Math.max(next, module.slot + 1), 0);
}

/** The next of a row of designations: the commonest stem with the number after its highest; `first` where there is none yet. */
export function nextName(names: readonly string[], first: string): string {
  const numbers = new Map<string, number[]>();
  for (const name of names) {
    const match = /^(.*?)(\d+)$/.exec(name);
    if (match) numbers.set(match[1], [...(numbers.get(match[1]) ?? []), Number(match[2])]);
  }
  const [stem] = [...numbers].sort((a, b) => b[1].length - a[1].length);
  return stem ? `${stem[0]}${Math.max(...stem[1]) + 1}` : first;
}
