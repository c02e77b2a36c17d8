import type { Project } from '#calc';
import type { ColumnId } from './grid-columns';
import type { PointRow } from './point-rows';

/** The figures of a row that lie beyond the project's policies, by their column. */
export function beyondPolicy({ plan, timed }: Pick<PointRow, 'plan' | 'timed'>, project: Project): ReadonlySet<ColumnId> {
  const figures = plan ?? timed;
  const beyond = new Set<ColumnId>();
  if (!figures) return beyond;
  if (figures.lifeDays > project.maxCartridgeDays || figures.lifeDays < project.minCartridgeDays) beyond.add('life');
  if ((figures.overGreasingPercent ?? 0) > project.maxOverGreasingPercent) beyond.add('over');
  return beyond;
}
