import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { Catalogue } from '#contract';
import type { Observable } from 'rxjs';
import type { Entry } from './fields/field';

@Injectable({ providedIn: 'root' })
export class CatalogueApi {
  private readonly http = inject(HttpClient);

  /** The organisation's catalogue, every version. */
  read(): Observable<Catalogue> {
    return this.http.get<Catalogue>('/api/v1/catalogue');
  }

  /** Adds a type; a name that exists becomes its next version. The same id again gives the same type. */
  add(path: string, body: Readonly<Record<string, unknown>>): Observable<Entry> {
    return this.http.post<Entry>(`/api/v1/catalogue/${path}`, body);
  }
}
