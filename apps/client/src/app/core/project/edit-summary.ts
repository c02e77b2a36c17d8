import type { DesignDocument, EditableCollection, RowChange } from '#contract';
import { fieldName } from '#contract/field-words';
import { rowOf } from './document-rows';

type Collection = EditableCollection | 'projects';

/** One row and several, as the history calls them. */
const CALLED: Readonly<Record<Collection, readonly [one: string, several: string]>> = {
  projects: ['the project', 'projects'], points: ['', 'points'], dispensers: ['', 'points'], cabinets: ['cabinet', 'cabinets'],
  controllers: ['controller', 'controllers'], modules: ['module', 'modules'], moduleGroups: ['group', 'groups'], supplies: ['supply', 'supplies'],
  circuits: ['circuit', 'circuits'], cableNodes: ['box', 'boxes'], assignments: ['', 'mapped channels'],
};

/** What an edit is called in the history: "Dose of GC1-L01", "Type and wiring of 12 points". */
export function editSummary(document: DesignDocument, changes: readonly RowChange[]): string {
  const fields = [...new Set(changes.flatMap(({ values }) => Object.keys(values ?? {})))];
  const [first] = changes;
  const names = new Set(changes.map(({ collection, id }) => nameOf(document, collection, id)));
  const whose = names.size === 1 ? [...names][0] : `${names.size} ${CALLED[first.collection][1]}`;
  return `${listed(fields.map(fieldName))} of ${whose}`;
}

/** What people call a row; a dispenser goes by the tag of its point. */
function nameOf(document: DesignDocument, collection: Collection, id: string): string {
  const row = rowOf(document, collection, id);
  const [noun] = CALLED[collection];
  const text = (field: string): string => (typeof row?.[field] === 'string' ? row[field] : '');
  switch (collection) {
    case 'projects': return noun;
    case 'points': return text('tag');
    case 'dispensers': return nameOf(document, 'points', text('pointId'));
    case 'assignments': return nameOf(document, 'dispensers', text('dispenserId'));
    case 'moduleGroups': return `${noun} ${Number(row?.['groupIndex']) + 1} of ${nameOf(document, 'modules', text('moduleId'))}`;
    default: return `${noun} ${text('name') || text('location')}`;
  }
}

/** "Dose", "Dose and cartridge", "Dose, cartridge and 2 more" */
function listed([first = 'Nothing', second, ...others]: readonly string[]): string {
  const small = second?.replace(/^[A-Z](?=[a-z])/, (letter) => letter.toLowerCase());
  if (!small) return first;
  return others.length > 0 ? `${first}, ${small} and ${others.length} more` : `${first} and ${small}`;
}
