/** Stands on every document that no revision has been issued for. */
export const DRAFT_STATE = 'Draft, not for construction';

/** Quiet text under every document. */
export const DISCLAIMER =
  'Figures are design aids: local codes, the makers’ data and a licensed person’s judgement come first.';

/** The cautions of work at dispensers, in short. */
export const CAUTIONS: readonly string[] = [
  'Isolate, lock out and prove dead before wiring: machine drive and 24 V are two isolations.',
  'Only SELV or PELV 24 V.',
  'Keep clear of moving machinery; test-run with guards in place.',
  'A priming gun’s pressure can inject grease through skin.',
  'No live work, open box or ordinary phone in a classified area without a permit.',
  'Never mix greases without checking compatibility.',
];
