import { type Context, withOrg } from '../platform/context.ts';
import { etag } from '../platform/http/answer.ts';
import { NotFound } from '../platform/problems.ts';
import { type DesignStamp, findDesign, findDesignStamp } from './design-queries.ts';

export interface Design {
  readonly etag: string;
  /** JSON text; null: what the reader has is still right. */
  readonly text: string | null;
}

/** Reads the whole design, unless the one that `known` names (If-None-Match) is the same. @throws {NotFound} */
export const readDesign = (context: Context, projectId: string, known: string | undefined): Promise<Design> =>
  withOrg(context, async (tx) => {
    const stamp = known === undefined ? undefined : await findDesignStamp(tx, projectId);
    if (stamp && known?.includes(tagOf(stamp))) return { etag: tagOf(stamp), text: null };
    const design = await findDesign(tx, projectId);
    if (!design) throw new NotFound('project');
    return { etag: tagOf(design), text: design.text };
  });

const tagOf = ({ sequence, entries }: DesignStamp): string => etag(`${sequence}.${entries}`);
