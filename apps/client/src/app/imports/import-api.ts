import { HttpClient, type HttpEvent } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { ImportPreview, ImportResult, ImportRowPage, ImportSettings, ImportWork, RowFilter } from '#contract';
import type { Observable } from 'rxjs';

@Injectable({ providedIn: 'root' })
export class ImportApi {
  private readonly http = inject(HttpClient);

  /** Keeps the file at the server and says what importing it would do; tells on the way how many bytes have gone. */
  upload(projectId: string, importId: string, file: File): Observable<HttpEvent<ImportPreview>> {
    const form = new FormData();
    form.append('id', importId); // Before the file: the server has to know it while it still reads.
    form.append('file', file, file.name);
    return this.http.post<ImportPreview>(`/api/v1/projects/${projectId}/imports`, form, { reportProgress: true, observe: 'events' });
  }

  /** The same with other settings; nothing is changed. */
  preview(projectId: string, importId: string, settings: ImportSettings): Observable<ImportPreview> {
    return this.http.post<ImportPreview>(`${url(projectId, importId)}/preview`, settings);
  }

  /** Some rows of the last preview. */
  rows(projectId: string, importId: string, show: RowFilter, offset: number, limit: number): Observable<ImportRowPage> {
    return this.http.get<ImportRowPage>(`${url(projectId, importId)}/rows`, { params: { show, offset, limit } });
  }

  /** Reads the kept file again with these settings and imports it in one transaction. */
  commit(projectId: string, importId: string, settings: ImportSettings): Observable<ImportResult> {
    return this.http.post<ImportResult>(`${url(projectId, importId)}/commit`, settings);
  }

  /** How far the server is; null where it is not at work on this import. */
  work(projectId: string, importId: string): Observable<ImportWork | null> {
    return this.http.get<ImportWork | null>(`${url(projectId, importId)}/work`);
  }

  /** Asks the server to stop; the request that waits for the work then ends with the problem "cancelled". */
  stop(projectId: string, importId: string): Observable<void> {
    return this.http.delete<void>(`${url(projectId, importId)}/work`);
  }
}

const url = (projectId: string, importId: string): string => `/api/v1/projects/${projectId}/imports/${importId}`;
