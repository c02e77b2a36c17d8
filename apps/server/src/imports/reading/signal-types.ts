import type { Purpose } from '#calc';
import { normalHeading } from './heading-text.ts';

/** What a row of a signal list may stand for, by the words that people choose from. */
export const SIGNAL_TYPES = ['control output', 'status input', 'no signal of a dispenser'] as const;
export type SignalType = (typeof SIGNAL_TYPES)[number];

/** The purpose of a dispenser's signal; null: none of a dispenser. */
export const PURPOSE_OF: Readonly<Record<SignalType, Purpose | null>> = {
  'control output': 'control',
  'status input': 'status',
  'no signal of a dispenser': null,
};

const WORDS: Readonly<Record<'control output' | 'status input', readonly string[]>> = {
  'control output': [
    ...['do', 'dq', 'q', 'o', 'out', 'output', 'digital output', 'binary output', 'control', 'pulse', 'control pulse'],
    ...['ausgang', 'digitalausgang', 'digitaler ausgang', 'binarausgang', 'uitgang', 'digitale uitgang'],
    ...['sortie', 'sortie tor', 'sortie digitale', 'sortie numerique', 'salida', 'salida digital'],
  ],
  'status input': [
    ...['di', 'i', 'in', 'input', 'digital input', 'binary input', 'status', 'status signal', 'feedback'],
    ...['eingang', 'digitaleingang', 'digitaler eingang', 'binareingang', 'ruckmeldung', 'ingang', 'digitale ingang'],
    ...['entree', 'entree tor', 'entree digitale', 'entree numerique', 'entrada', 'entrada digital'],
  ],
};

const BY_WORD = new Map<string, SignalType>([
  ...SIGNAL_TYPES.map((type) => [type, type] as const),
  ...(['control output', 'status input'] as const).flatMap((type) => WORDS[type].map((word) => [word, type] as const)),
]);

/** The signal that a text names: DO, Q, output, Ausgang … or DI, I, input, Eingang …; null when it is neither. */
export function signalTypeOf(text: string): SignalType | null {
  return BY_WORD.get(normalHeading(text)) ?? null;
}
