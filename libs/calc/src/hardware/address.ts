import type { Module, ModuleType } from '../design.ts';
import { type DesignIndex, grouped } from '../design-index.ts';
import { makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';

/** A direct address taken apart. */
export interface DirectAddress {
  readonly kind: 'output' | 'input';
  readonly byte: number;
  readonly bit: number;
}

/**
 * Direct address of a channel, `%QX4.3` or `%IX4.3`: byte = base + ⌊channel / 8⌋, bit = channel mod 8.
 *
 * @throws {RangeError} a channel or base that is not a whole number from 0
 */
export function directAddress(kind: 'output' | 'input', baseByte: number, channel: number): string {
  if (!Number.isInteger(baseByte) || baseByte < 0) throw new RangeError(`Base byte ${baseByte} is not a whole number from 0`);
  if (!Number.isInteger(channel) || channel < 0) throw new RangeError(`Channel ${channel} is not a whole number from 0`);
  return `%${kind === 'output' ? 'Q' : 'I'}X${baseByte + Math.floor(channel / 8)}.${channel % 8}`;
}

/**
 * Reads a direct bit address as IEC 61131-3 writes it: `%QX4.3`, or without the size prefix, `%Q4.3`;
 * case does not matter, spaces around do not either.
 *
 * @returns null for anything else, also for a bit beyond 7
 */
export function parseAddress(text: string): DirectAddress | null {
  const match = /^%([QI])X?(\d{1,5})\.([0-7])$/i.exec(text.trim());
  if (!match) return null;
  return { kind: match[1].toUpperCase() === 'Q' ? 'output' : 'input', byte: Number(match[2]), bit: Number(match[3]) };
}

/** Channel of a module that an address names; null where it lies on another kind or outside the module. */
export function channelOfAddress(address: DirectAddress, module: Module, type: ModuleType): number | null {
  const channel = (address.byte - module.baseByte) * 8 + address.bit;
  return address.kind === type.kind && channel >= 0 && channel < type.channels ? channel : null;
}

/** Byte ranges of modules that overlap on one controller: outputs and inputs are told apart. */
export function addressFindings(index: DesignIndex): Finding[] {
  const findings: Finding[] = [];
  const families = grouped(index.design.modules, (m) => {
    const type = index.moduleTypes.get(m.typeId);
    return type ? `${m.controllerId}/${type.kind}` : null;
  });
  for (const modules of families.values()) findings.push(...overlaps(index, modules));
  return findings;
}

function overlaps(index: DesignIndex, modules: readonly Module[]): Finding[] {
  const sorted = [...modules].sort((a, b) => a.baseByte - b.baseByte || a.slot - b.slot);
  const findings: Finding[] = [];
  let reach = sorted[0];
  for (const module of sorted.slice(1)) {
    if (module.baseByte <= lastByte(index, reach)) findings.push(overlap(index, reach, module));
    if (lastByte(index, module) > lastByte(index, reach)) reach = module;
  }
  return findings;
}

function overlap(index: DesignIndex, first: Module, second: Module): Finding {
  const controller = index.controllers.get(second.controllerId)?.name ?? '';
  const free = lastByte(index, first) + 1;
  return makeFinding('IO-07', 'module', second.id, `${controller} ${second.name}`.trim(), {
    title: `${second.name} begins at byte ${second.baseByte}, ${first.name} reaches to byte ${free - 1}`,
    detail: 'Two channels would have the same direct address.',
    remedy: `Set the base byte of ${second.name} to ${free} or higher.`,
    compared: [{ name: 'base byte', value: second.baseByte, limit: free, unit: '' }],
    mark: first.id,
  });
}

function lastByte(index: DesignIndex, module: Module): number {
  const channels = index.moduleTypes.get(module.typeId)?.channels ?? 1;
  return module.baseByte + Math.max(1, Math.ceil(channels / 8)) - 1;
}
