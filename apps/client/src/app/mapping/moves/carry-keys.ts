export type CarryAct =
  | { readonly kind: 'step' | 'group'; readonly by: 1 | -1 }
  | { readonly kind: 'drop' | 'cancel' | 'unmap' };

const ACTS: ReadonlyMap<string, CarryAct> = new Map<string, CarryAct>([
  ['ArrowDown', { kind: 'step', by: 1 }],
  ['ArrowUp', { kind: 'step', by: -1 }],
  ['PageDown', { kind: 'group', by: 1 }],
  ['PageUp', { kind: 'group', by: -1 }],
  ['Enter', { kind: 'drop' }],
  [' ', { kind: 'drop' }],
  ['Escape', { kind: 'cancel' }],
  ['Delete', { kind: 'unmap' }],
]);

/** What a key means while something is carried by the keyboard. */
export const carryAct = ({ key }: Pick<KeyboardEvent, 'key'>): CarryAct | null => ACTS.get(key) ?? null;
