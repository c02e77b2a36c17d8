import type { Controller, Purpose } from '#calc';
import { addressOf, type DesignIndex, type TypedModule } from './design-index.ts';
import type { Fault, ProblemCode } from './plan.ts';

/** What a row says of one signal; null each: nothing. */
export interface SignalTexts {
  readonly module: string | null;
  readonly channel: number | null;
  readonly address: string | null;
}

/** A channel that exists. */
export interface Channel {
  readonly module: TypedModule;
  readonly channel: number;
}

/** The channel a row asks for, or what is wrong with it. `said` names the part of the row to blame. */
export type Resolved =
  | { readonly channel: Channel; readonly fault: null }
  | { readonly channel: null; readonly fault: Fault; readonly said: keyof SignalTexts };

interface DirectAddress {
  readonly kind: 'output' | 'input';
  readonly byte: number;
  readonly bit: number;
}

const KIND: Readonly<Record<Purpose, 'output' | 'input'>> = { control: 'output', status: 'input' };

/**
 * Finds the channel that module and channel, or a direct address, or both name on a controller. Given
 * both, they must agree. Whether somebody else has the channel is not asked here.
 *
 * @param texts at least one of them is not null
 */
export function resolveSignal(
  texts: SignalTexts,
  purpose: Purpose,
  controller: Controller | null,
  index: DesignIndex,
): Resolved {
  if (!controller) {
    return wrong(
      texts.address === null ? 'module' : 'address',
      'controller-missing',
      `The row names ${purpose === 'control' ? 'an output' : 'a status input'} but no controller.`,
      'Add the controller: names and addresses of channels are its own.',
    );
  }
  const byAddress = texts.address === null ? null : byDirectAddress(texts.address, purpose, controller, index);
  if (byAddress?.fault) return byAddress;
  if (texts.module === null && byAddress) return agreeing(byAddress.channel, texts);
  const byName = byModuleAndChannel(texts, purpose, controller, index, byAddress?.channel ?? null);
  if (byName.fault || !byAddress) return byName;
  return sameChannel(byName.channel, byAddress.channel) ? byName : contradiction(byName.channel, texts.address!);
}

/** An address with a channel beside it, but no module. */
function agreeing(found: Channel, texts: SignalTexts): Resolved {
  if (texts.channel === null || texts.channel === found.channel) return { channel: found, fault: null };
  return wrong(
    'address',
    'address-contradiction',
    `${addressOf(found.module, found.channel)} is ${nameOf(found)}, the row says channel ${texts.channel}.`,
    'Correct the one that is wrong, or leave one of them blank.',
  );
}

function contradiction(named: Channel, address: string): Resolved {
  return wrong(
    'address',
    'address-contradiction',
    `${nameOf(named)} is ${addressOf(named.module, named.channel)}, the row says ${address}.`,
    'Correct the one that is wrong, or leave one of them blank.',
  );
}

function byDirectAddress(text: string, purpose: Purpose, controller: Controller, index: DesignIndex): Resolved {
  const parsed = parseAddress(text);
  if (parsed === null) {
    const example = purpose === 'control' ? '%QX4.3' : '%IX4.3';
    return wrong(
      'address',
      'address-malformed',
      `“${text}” is no direct address: a byte and a bit from 0 to 7 are needed.`,
      `Write it like ${example}.`,
    );
  }
  if (parsed.kind !== KIND[purpose]) return wrongKind(text, purpose);
  const module = index.moduleAt(controller.id, parsed.kind, parsed.byte);
  if (!module) {
    return wrong(
      'address',
      'no-such-module',
      `No ${parsed.kind} module of ${controller.name} covers byte ${parsed.byte}.`,
      'Correct the address, or add the module to the hardware first.',
    );
  }
  return channelOf(module, (parsed.byte - module.baseByte) * 8 + parsed.bit, 'address');
}

function wrongKind(text: string, purpose: Purpose): Resolved {
  return purpose === 'control'
    ? wrong(
        'address',
        'address-wrong-kind',
        `“${text}” is an input, the column holds outputs.`,
        'Write an output address (%QX…), or map the column to the status address.',
      )
    : wrong(
        'address',
        'address-wrong-kind',
        `“${text}” is an output, the column holds status inputs.`,
        'Write an input address (%IX…), or map the column to the output address.',
      );
}

function byModuleAndChannel(
  texts: SignalTexts,
  purpose: Purpose,
  controller: Controller,
  index: DesignIndex,
  addressed: Channel | null,
): Resolved {
  if (texts.module === null) {
    return wrong(
      'channel',
      'module-missing',
      `The row names channel ${texts.channel} but no module.`,
      'Add the module, or write the direct address.',
    );
  }
  const module = index.moduleNamed(controller.id, texts.module);
  if (!module)
    return wrong(
      'module',
      'no-such-module',
      `${controller.name} has no module ${texts.module}.`,
      moduleRemedy(purpose, controller, index),
    );
  if (module.type.kind !== KIND[purpose]) {
    const needed = purpose === 'control' ? 'an output module' : 'an input module';
    return wrong(
      'module',
      'address-wrong-kind',
      `${module.name} of ${controller.name} is an ${module.type.kind} module; here ${needed} is needed.`,
      moduleRemedy(purpose, controller, index),
    );
  }
  if (texts.channel !== null) return channelOf(module, texts.channel, 'channel');
  if (addressed) return withinModule(addressed, module);
  return wrong(
    'module',
    'channel-missing',
    `The row names module ${module.name} but no channel.`,
    'Add the channel, counted from 0, or leave the module blank too.',
  );
}

/** An address with a module beside it, but no channel. */
function withinModule(addressed: Channel, module: TypedModule): Resolved {
  if (addressed.module.id === module.id) return { channel: addressed, fault: null };
  return wrong(
    'address',
    'address-contradiction',
    `${addressOf(addressed.module, addressed.channel)} is ${nameOf(addressed)}, the row says module ${module.name}.`,
    'Correct the one that is wrong, or leave one of them blank.',
  );
}

function moduleRemedy(purpose: Purpose, controller: Controller, index: DesignIndex): string {
  const names = index
    .modulesOf(controller)
    .filter((each) => each.type.kind === KIND[purpose])
    .map((each) => each.name);
  return names.length === 0
    ? 'Add the module to the hardware first.'
    : `Choose one of ${names.join(', ')}, or add the module to the hardware first.`;
}

function channelOf(module: TypedModule, channel: number, said: keyof SignalTexts): Resolved {
  const last = module.type.channels - 1;
  if (Number.isInteger(channel) && channel >= 0 && channel <= last)
    return { channel: { module, channel }, fault: null };
  return wrong(
    said,
    'no-such-channel',
    `${module.name} has channels 0 to ${last}, not ${channel}.`,
    `Write a channel from 0 to ${last}; channels count from 0.`,
  );
}

const DIRECT_ADDRESS = /^%([QI])X?(\d{1,6})\.([0-7])$/i;

/** IEC 61131-3: %QX4.3, the X may be left out; null when it is none. */
function parseAddress(text: string): DirectAddress | null {
  const parts = DIRECT_ADDRESS.exec(text) ?? DIRECT_ADDRESS.exec(text.normalize('NFKC').replace(/\s/g, ''));
  if (!parts) return null;
  return { kind: parts[1].toUpperCase() === 'Q' ? 'output' : 'input', byte: Number(parts[2]), bit: Number(parts[3]) };
}

function sameChannel(a: Channel, b: Channel): boolean {
  return a.module.id === b.module.id && a.channel === b.channel;
}

/** A channel as a person names it, for instance `DO1 channel 3`. */
export function nameOf({ module, channel }: Channel): string {
  return `${module.name} channel ${channel}`;
}

function wrong(said: keyof SignalTexts, code: ProblemCode, message: string, remedy: string): Resolved {
  return { channel: null, fault: { code, message, remedy }, said };
}
