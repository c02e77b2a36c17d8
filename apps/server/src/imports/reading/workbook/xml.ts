import { SaxesParser, type SaxesTagPlain } from 'saxes';
import type { Archive } from './archive.ts';
import { BOUNDS } from './bounds.ts';
import { damaged, entitiesDeclared, tooMuchInside } from './refusals.ts';

export type Attributes = Readonly<Partial<Record<string, string>>>;

/** What a reader of one kind of part is told, in the order of the document; names come without prefix. */
export interface XmlHandlers {
  /** Elements that are left out with all they contain. */
  readonly skip: ReadonlySet<string>;
  open(name: string, attributes: Attributes): void;
  close?(name: string): void;
  text?(text: string): void;
}

/**
 * Reads a part of the archive as XML. Prefixes are dropped, so that the transitional and the strict
 * namespaces, and whatever prefix a writer gave them, read alike.
 *
 * @param onPiece told how many characters have been read after each piece of the part
 * @throws {ImportRefusal} for XML that is broken, declares a document type, or is out of all proportion
 */
export async function readXml(
  archive: Archive,
  part: string,
  handlers: XmlHandlers,
  onPiece: (characters: number) => void = () => undefined,
): Promise<void> {
  const reader = new XmlReader(part, handlers);
  for await (const piece of archive.textOf(part)) {
    reader.write(piece);
    onPiece(piece.length);
  }
  reader.end();
}

class XmlReader {
  private readonly parser = new SaxesParser({ xmlns: false, position: false });
  private depth = 0;
  /** Depth of the element that is being left out; 0 for none. */
  private skippedAt = 0;
  /** Characters since the parser last came to the end of a tag or a text. */
  private quiet = 0;

  constructor(
    private readonly part: string,
    private readonly handlers: XmlHandlers,
  ) {
    this.parser.on('error', () => this.fail());
    this.parser.on('doctype', () => {
      throw entitiesDeclared();
    });
    this.parser.on('opentag', (tag) => this.opened(tag));
    this.parser.on('closetag', (tag) => this.closed(tag));
    this.parser.on('text', (text) => this.texted(text));
    this.parser.on('cdata', (text) => this.texted(text));
  }

  write(piece: string): void {
    this.quiet += piece.length;
    this.parser.write(piece);
    // the parser keeps an unfinished text or tag, so one without end is stopped here
    if (this.quiet > BOUNDS.quietCharacters) throw tooMuchInside(`Its part ${this.part} has a text without end.`);
  }

  end(): void {
    this.parser.close();
  }

  private opened({ name, attributes }: SaxesTagPlain): void {
    this.quiet = 0;
    this.depth += 1;
    if (this.depth > BOUNDS.depth) throw tooMuchInside(`Its part ${this.part} is nested too deeply.`);
    if (this.skippedAt > 0) return;
    const local = localName(name);
    if (this.handlers.skip.has(local)) this.skippedAt = this.depth;
    else this.handlers.open(local, attributes);
  }

  private closed({ name }: SaxesTagPlain): void {
    this.quiet = 0;
    if (this.skippedAt === 0) this.handlers.close?.(localName(name));
    else if (this.skippedAt === this.depth) this.skippedAt = 0;
    this.depth -= 1;
  }

  private texted(text: string): void {
    this.quiet = 0;
    if (this.skippedAt === 0) this.handlers.text?.(text);
  }

  private fail(): never {
    throw damaged(`Its part ${this.part} is not well-formed.`);
  }
}

function localName(name: string): string {
  const colon = name.indexOf(':');
  return colon < 0 ? name : name.slice(colon + 1);
}

/** The value of an attribute whose name may carry a prefix, such as `r:id`. */
export function prefixedAttribute(attributes: Attributes, local: string): string | undefined {
  const name = Object.keys(attributes).find((each) => each.endsWith(`:${local}`));
  return name === undefined ? undefined : attributes[name];
}

/** XML's own truth values, as attributes of workbooks have them. */
export function isTrue(value: string | undefined): boolean {
  return value === '1' || value === 'true';
}
