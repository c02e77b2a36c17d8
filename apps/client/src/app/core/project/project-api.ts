import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { ChangeNotice, DesignDocument, HistoryEntry, NewChangeSet, NewProject, ProjectRow, ProjectSummary } from '#contract';
import type { Observable } from 'rxjs';

export type AnyRow = { readonly id: string; readonly version: number } & Record<string, unknown>;

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
  history(projectId: string, page: { readonly limit: number; readonly before?: number }): Observable<readonly HistoryEntry[]> {
    return this.http.get<readonly HistoryEntry[]>(`/api/v1/projects/${projectId}/history`, { params: { ...page } });
  }

  apply(projectId: string, changes: NewChangeSet): Observable<ChangeNotice> {
    return this.http.post<ChangeNotice>(`/api/v1/projects/${projectId}/change-sets`, changes);
  }

  /** Takes a change set back by a new one with this identifier. */
  undo(projectId: string, setId: string, id: string): Observable<ChangeNotice> {
    return this.http.post<ChangeNotice>(`/api/v1/projects/${projectId}/change-sets/${setId}/undo`, { id });
  }
}
