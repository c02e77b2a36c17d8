import type { ByteCache } from '../platform/byte-cache.ts';
import { type Context, withOrg } from '../platform/context.ts';
import { etag, JsonText } from '../platform/http/answer.ts';
import { NotFound } from '../platform/problems.ts';
import { type DesignStamp, findDesign, findDesignStamp } from './design-queries.ts';

export interface Design {
  readonly etag: string;
  /** Null: what the reader has is still right. */
  readonly body: JsonText | null;
}

/**
 * Reads the whole design, unless the one that `known` names (If-None-Match) is the same. The latest reading of a
 * project is kept with its compressed form: many people open the same design, few change it.
 *
 * @throws {NotFound}
 */
export const readDesign = (context: Context, cache: ByteCache, projectId: string, known: string | undefined): Promise<Design> =>
  withOrg(context, async (tx) => {
    const stamp = await findDesignStamp(tx, projectId);
    if (!stamp) throw new NotFound('project');
    if (known?.includes(tagOf(stamp))) return { etag: tagOf(stamp), body: null };
    const key = `design ${context.orgId} ${projectId}`;
    const kept = cache.get<Design>(key);
    if (kept?.etag === tagOf(stamp)) return kept;
    const found = await findDesign(tx, projectId);
    if (!found) throw new NotFound('project');
    const design = { etag: tagOf(found), body: new JsonText(found.text) };
    cache.put(key, design, found.text.length * BYTES_A_CHARACTER);
    return design;
  });

/** A text with any character beyond Latin-1 takes two bytes each, and its compressed form a tenth of that. */
const BYTES_A_CHARACTER = 2.2;

const tagOf = ({ sequence, entries }: DesignStamp): string => etag(`${sequence}.${entries}`);
