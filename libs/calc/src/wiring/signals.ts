import type { DispenserType, InputType, ModuleType, Polarity } from '../design.ts';

/** Limits of IEC 61131-2 digital inputs for 24 V DC by type. */
export interface InputLimits {
  /** Least voltage of the 1 state, V, and least current in it, A. */
  readonly onV: number;
  readonly onA: number;
  /** Most voltage of the 0 state, V, and the current up to which the input stays 0 for certain, A. */
  readonly offV: number;
  readonly offA: number;
}

export const INPUT_LIMITS: Readonly<Record<InputType, InputLimits>> = {
  1: { onV: 15, onA: 0.002, offV: 5, offA: 0.0005 },
  2: { onV: 11, onA: 0.006, offV: 5, offA: 0.002 },
  3: { onV: 11, onA: 0.002, offV: 5, offA: 0.0015 },
};

/** What the network says of the supply conductors at a device, V. */
export interface ConductorDrops {
  readonly lowestV: number;
  /** Rise of the device's own 0 V and drop on its +24 V, with supply and protection, worst set. */
  readonly zeroRiseV: number;
  readonly plusDropV: number;
}

/** One signal core from the module to the device, Ω: the trunk's multicore and the lane's own cable. */
export function signalCoreOhm(trunkSignalOhm: number, ownOhm: number): number {
  return trunkSignalOhm + ownOhm;
}

/**
 * Pulse level at a four-core device, V, between pulse input and the conductor it works against.
 * Sourcing: supply − output drop − I·R(core) − rise of the device's own 0 V. Sinking: the same against
 * +24 V, with the drop on that conductor, which then carries the pulse current too.
 */
export function pulseLevelV(output: Polarity, drops: ConductorDrops, outputDropV: number, controlA: number, coreOhm: number): number {
  const shared = output === 'sourcing' ? drops.zeroRiseV : drops.plusDropV;
  return drops.lowestV - outputDropV - controlA * coreOhm - shared;
}

/**
 * Level at the PLC input while the status is on, V. A sourcing status output: supply − drop on the
 * +24 V conductor − the device's own drop − I_in·R(core); a sinking one: with the rise of its 0 V.
 */
export function statusLevelV(status: NonNullable<DispenserType['status']>, drops: ConductorDrops, inputA: number, coreOhm: number): number {
  const shared = status.polarity === 'sourcing' ? drops.plusDropV : drops.zeroRiseV;
  return drops.lowestV - shared - status.dropV - inputA * coreOhm;
}

/**
 * Whether a status output and an input fit: a sourcing output wants a sinking input, the current's way
 * into the input being what "sinking" names (IEC 61131-2).
 */
export function statusFitsInput(status: Polarity, input: Polarity): boolean {
  return status !== input;
}

/** Whether an output fits the device: the polarity that the type wants; a relay contact fits either. */
export function outputFits(module: ModuleType, wanted: Polarity): boolean {
  return module.technology === 'relay' || module.polarity === wanted;
}

/** Polarity with which a lane is pulsed: that of its transistor output; over a relay, and while unmapped, what the device wants. */
export function pulsePolarity(device: Pick<DispenserType, 'controlPolarity'>, output: ModuleType | null | undefined): Polarity {
  return output?.kind === 'output' && output.technology !== 'relay' ? output.polarity : device.controlPolarity;
}

/** Current that an input draws, A: as its type states, else the least that its IEC 61131-2 type asks for. */
export function inputCurrentA(input: ModuleType): number {
  return input.inputA ?? leastInputA(input);
}

/** Current that a status output must deliver into an input, A: what it draws, and no less than its IEC 61131-2 type asks for. */
export function neededInputA(input: ModuleType): number {
  return Math.max(inputCurrentA(input), leastInputA(input));
}

/**
 * Voltage that leakage leaves at an input that should be off, V: the input counts as a resistor that
 * draws its current at 24 V. 0 where its current is unknown.
 */
export function leakageLevelV(leakageA: number, input: ModuleType): number {
  const amps = inputCurrentA(input);
  return amps > 0 ? (leakageA * 24) / amps : 0;
}

function leastInputA(input: ModuleType): number {
  return input.inputType === null ? 0 : INPUT_LIMITS[input.inputType].onA;
}

/** Operations of a relay contact in the years it must last. */
export function relayOperations(pulsesPerYear: number, years: number): number {
  return pulsesPerYear * years;
}
