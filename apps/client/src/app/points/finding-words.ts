import type { Finding } from '#calc';

/** A finding in a few words, where its sentence would not fit; by its code. */
const WORDS: Readonly<Record<string, string>> = {
  'PL-01': 'no demand', 'PL-02': 'no dispenser', 'PL-03': 'no type', 'PL-04': 'no cartridge', 'PL-05': 'no dose', 'PL-06': 'no hours',
  'PL-07': 'no wiring', 'PL-08': 'no period', 'PL-10': 'dose range', 'PL-11': 'dose step', 'PL-12': 'cartridge misfit', 'PL-13': 'no whole dose',
  'PL-14': 'too frequent', 'PL-15': 'too long', 'PL-16': 'too short', 'PL-17': 'too much', 'PL-20': 'wiring', 'PL-21': 'two-core timed',
  'PL-22': 'no timed', 'PL-23': 'period misfit', 'PL-24': 'too little', 'PL-30': 'fast bearing',
  'AR-01': 'not for zone', 'AR-02': 'level unknown', 'AR-03': 'no zone', 'AR-04': 'no surface temp.', 'CB-03': 'cable twice', 'IO-03': 'group overload',
  'MP-01': 'no output', 'MP-02': 'no status input', 'PR-02': 'will not trip', 'PR-08': 'not computable', 'SG-09': 'relay wear', 'SG-10': 'input leakage',
  'SU-03': 'not computable', 'TG-01': 'tag twice', 'VD-01': 'low voltage', 'VD-02': 'low voltage',
};

export const findingWords = (finding: Finding): string => WORDS[finding.code] ?? finding.title;
