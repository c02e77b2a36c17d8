import type { Design, Project, Versioned } from '#calc';
import type { DesignDocument } from './projects.ts';

/** The calculation's input: the document's rows as they are, with the catalogue beside them. */
export function designOf(document: DesignDocument): Design & { readonly project: Versioned<Project> } {
  const { sequence: _sequence, catalogue, ...rows } = document;
  return { ...rows, ...catalogue };
}
