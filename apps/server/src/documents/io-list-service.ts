import { assess } from '#calc';
import { ioList, type IoList } from '#documents';
import type { Context } from '../platform/context.ts';
import { loadDesign } from '../projects/load-design.ts';
import { dayInZone } from './day-in-zone.ts';

/** The I/O list of a project's draft as it is now. @throws {NotFound} */
export async function readIoList(context: Context, projectId: string): Promise<IoList> {
  const design = await loadDesign(context, projectId);
  return ioList(design, assess(design), dayInZone(new Date(), design.project.timeZone));
}
