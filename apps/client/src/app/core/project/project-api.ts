import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type {
  ChangeNotice, DesignDocument, EditableCollection, HistoryEntry, NewChangeSet, NewProject, ProjectRow, ProjectSummary,
} from '#contract';
import type { Observable } from 'rxjs';

export type AnyRow = { readonly id: string; readonly version: number } & Record<string, unknown>;

const paths: Readonly<Record<EditableCollection, string>> = {
  points: 'points', dispensers: 'dispensers', cabinets: 'cabinets', controllers: 'controllers', modules: 'modules',
  moduleGroups: 'module-groups', supplies: 'supplies', circuits: 'circuits', cableNodes: 'cable-nodes', assignments: 'assignments',
};

@Injectable({ providedIn: 'root' })
export class ProjectApi {
  private readonly http = inject(HttpClient);

  list(): Observable<readonly ProjectSummary[]> {
    return this.http.get<readonly ProjectSummary[]>('/api/v1/projects');
  }

  create(project: NewProject): Observable<ProjectRow> {
    return this.http.post<ProjectRow>('/api/v1/projects', project);
  }

  design(projectId: string): Observable<DesignDocument> {
    return this.http.get<DesignDocument>(`/api/v1/projects/${projectId}/design`);
  }

  changesSince(projectId: string, sequence: number): Observable<ChangeNotice> {
    return this.http.get<ChangeNotice>(`/api/v1/projects/${projectId}/changes`, { params: { since: sequence } });
  }

  /** Latest first; `before` is the sequence number of the last entry seen. */
  history(projectId: string, before?: number): Observable<readonly HistoryEntry[]> {
    return this.http.get<readonly HistoryEntry[]>(`/api/v1/projects/${projectId}/history`, { params: before === undefined ? {} : { before } });
  }

  patch(projectId: string, collection: EditableCollection | 'projects', id: string, version: number, values: object): Observable<AnyRow> {
    const url = collection === 'projects' ? `/api/v1/projects/${projectId}` : `/api/v1/projects/${projectId}/${paths[collection]}/${id}`;
    return this.http.patch<AnyRow>(url, values, { headers: { 'If-Match': `"${version}"` } });
  }

  apply(projectId: string, changes: NewChangeSet): Observable<ChangeNotice> {
    return this.http.post<ChangeNotice>(`/api/v1/projects/${projectId}/change-sets`, changes);
  }
}
