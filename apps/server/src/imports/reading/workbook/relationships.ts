import type { Archive } from './archive.ts';
import { readXml } from './xml.ts';

/** A link from one part of the archive to another. */
export interface Relationship {
  readonly id: string;
  /** The last word of its type, such as `worksheet`: the same in the transitional and the strict form. */
  readonly kind: string;
  /** The part it leads to, from the root of the archive. */
  readonly part: string;
}

const NOTHING: ReadonlySet<string> = new Set();

/**
 * The links that a part has inside the archive; those that lead out of it are left out and never followed.
 *
 * @param part the part, or '' for the archive itself
 */
export async function relationshipsOf(archive: Archive, part: string): Promise<readonly Relationship[]> {
  const links = linksPart(part);
  if (!archive.has(links)) return [];
  const found: Relationship[] = [];
  await readXml(archive, links, {
    skip: NOTHING,
    open(name, { Id, Type, Target, TargetMode }) {
      if (name !== 'Relationship' || !Id || !Type || !Target || TargetMode === 'External') return;
      found.push({ id: Id, kind: Type.slice(Type.lastIndexOf('/') + 1), part: resolved(part, Target) });
    },
  });
  return found;
}

function linksPart(part: string): string {
  const slash = part.lastIndexOf('/') + 1;
  return `${part.slice(0, slash)}_rels/${part.slice(slash)}.rels`;
}

/** A target as a part's name: relative to the folder of the part that names it, unless it begins at the root. */
function resolved(from: string, target: string): string {
  const base = target.startsWith('/') ? [] : from.split('/').slice(0, -1);
  const steps = [...base, ...target.replaceAll('\\', '/').split('/')];
  return steps
    .reduce<string[]>((path, step) => {
      if (step === '..') return path.slice(0, -1);
      return step === '' || step === '.' ? path : [...path, step];
    }, [])
    .join('/');
}
