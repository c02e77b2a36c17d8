export type ChannelAct = 'up' | 'down' | 'extend-up' | 'extend-down' | 'all' | 'toggle' | 'search' | 'fill' | 'unmap' | 'move';

type Keys = Pick<KeyboardEvent, 'key' | 'code' | 'shiftKey' | 'ctrlKey' | 'altKey' | 'metaKey'>;

/** What a key means on a row that is not being edited; null: nothing, or a letter to search with. */
export function channelAct(event: Keys): ChannelAct | null {
  const { key, shiftKey } = event;
  // With Alt some keyboards give another letter: the key's place counts.
  if (event.altKey) return event.code === 'KeyM' ? 'move' : null;
  if (event.ctrlKey || event.metaKey) return key.toLowerCase() === 'a' ? 'all' : null;
  if (key === 'ArrowUp') return shiftKey ? 'extend-up' : 'up';
  if (key === 'ArrowDown') return shiftKey ? 'extend-down' : 'down';
  if (key === 'Enter') return shiftKey ? 'fill' : 'search';
  if (key === ' ') return 'toggle';
  return key === 'Delete' ? 'unmap' : null;
}

export const isTyped = ({ key, ctrlKey, altKey, metaKey }: Keys): boolean => key.length === 1 && key !== ' ' && !ctrlKey && !altKey && !metaKey;
