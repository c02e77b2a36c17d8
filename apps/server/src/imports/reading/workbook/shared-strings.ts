import type { Archive } from './archive.ts';
import { BOUNDS } from './bounds.ts';
import { detached, TextCollector, unescaped } from './cell-text.ts';
import { tooMuchInside } from './refusals.ts';
import { readXml } from './xml.ts';

/** Readings of East Asian texts stand beside the text and are no part of it. */
const SKIP: ReadonlySet<string> = new Set(['rPh', 'phoneticPr', 'extLst']);

/**
 * The texts that cells name by number, rich ones joined. A text longer than a cell may be is kept only as far
 * as it takes to refuse the cell that uses it.
 *
 * @throws {ImportRefusal} when there are more than any list needs
 */
export async function readSharedStrings(archive: Archive, part: string): Promise<readonly string[]> {
  const strings: string[] = [];
  const collected = new TextCollector();
  let inText = false;
  let characters = 0;
  await readXml(archive, part, {
    skip: SKIP,
    open(name) {
      if (name === 'si') collected.clear();
      inText = name === 't';
    },
    text(text) {
      if (inText) collected.add(text);
    },
    close(name) {
      inText = false;
      if (name !== 'si') return;
      characters += collected.text.length;
      if (strings.length === BOUNDS.sharedStrings || characters > BOUNDS.sharedCharacters) {
        throw tooMuchInside('It holds more texts than a list can need.');
      }
      strings.push(detached(unescaped(collected.text)));
    },
  });
  return strings;
}
