import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { ImportPreview, ImportResult, ImportSettings } from '#contract';
import type { Observable } from 'rxjs';

@Injectable({ providedIn: 'root' })
export class ImportApi {
  private readonly http = inject(HttpClient);

  /** Keeps the file at the server and says what importing it would do. */
  upload(projectId: string, file: File): Observable<ImportPreview> {
    const form = new FormData();
    form.append('file', file, file.name);
    return this.http.post<ImportPreview>(`/api/v1/projects/${projectId}/imports`, form);
  }

  /** The same with other settings; nothing is changed. */
  preview(projectId: string, importId: string, settings: ImportSettings): Observable<ImportPreview> {
    return this.http.post<ImportPreview>(`/api/v1/projects/${projectId}/imports/${importId}/preview`, settings);
  }

  /** Reads the kept file again with these settings and imports it in one transaction. */
  commit(projectId: string, importId: string, settings: ImportSettings): Observable<ImportResult> {
    return this.http.post<ImportResult>(`/api/v1/projects/${projectId}/imports/${importId}/commit`, settings);
  }
}
