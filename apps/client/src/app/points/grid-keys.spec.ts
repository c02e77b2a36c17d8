import { describe, expect, it } from 'vitest';
import { editorAct, gridCommand, type Key, pastedBlock } from './grid-keys';

const key = (name: string, held: Partial<Key> = {}): Key => ({ key: name, ctrlKey: false, metaKey: false, altKey: false, shiftKey: false, ...held });

describe('gridCommand', () => {
  it.each([
    [key('7'), { kind: 'edit', text: '7' }],
    [key('n'), { kind: 'edit', text: 'n' }],
    [key('Enter'), { kind: 'edit', text: null }],
    [key('F2'), { kind: 'edit', text: null }],
    [key('Delete'), { kind: 'clear' }],
    [key(' '), { kind: 'tick' }],
    [key('d', { ctrlKey: true }), { kind: 'fill-down' }],
    [key('D', { ctrlKey: true }), { kind: 'fill-down' }],
    [key('n', { altKey: true }), { kind: 'next-finding' }],
    [key('ArrowDown', { altKey: true }), { kind: 'alternatives' }],
    [key('ArrowDown', { shiftKey: true }), { kind: 'move', rows: 1, columns: 0, extend: true }],
    [key('PageUp'), { kind: 'move', rows: -20, columns: 0, extend: false }],
    [key('End', { ctrlKey: true }), { kind: 'edge', rows: 1, columns: 1, extend: false }],
    [key('ArrowUp', { ctrlKey: true }), { kind: 'edge', rows: -1, columns: 0, extend: false }],
  ])('%j asks for %j', (pressed, command) => expect(gridCommand(pressed, 20)).toEqual(command));

  it.each([key('Tab'), key('v', { ctrlKey: true }), key('k', { ctrlKey: true }), key('f', { altKey: true }), key('F5'), key('Shift')])(
    'leaves %j to others', (pressed) => expect(gridCommand(pressed, 20)).toBeNull());
});

describe('editorAct', () => {
  it('commits down with Enter, right with Tab, and leaves with Escape', () => {
    expect(editorAct(key('Enter'))).toBe('down');
    expect(editorAct(key('Tab'))).toBe('right');
    expect(editorAct(key('Tab', { shiftKey: true }))).toBe('left');
    expect(editorAct(key('Escape'))).toBe('cancel');
    expect(editorAct(key('ArrowLeft'))).toBeNull();
  });
});

describe('pastedBlock', () => {
  it('reads rows and cells, without the last line end', () => {
    expect(pastedBlock('0.2\t160\r\n0.3\t80\r\n')).toEqual([['0.2', '160'], ['0.3', '80']]);
  });
  it('keeps empty cells and reads quoted ones', () => {
    expect(pastedBlock('\tb\n"a ""x""\tstill a"\t')).toEqual([['', 'b'], ['a "x"\tstill a', '']]);
  });
  it('reads a single value', () => expect(pastedBlock('0.4')).toEqual([['0.4']]));
});
