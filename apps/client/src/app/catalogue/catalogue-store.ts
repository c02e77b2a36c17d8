import { computed, inject, Injectable, signal } from '@angular/core';
import type { Problem } from '#contract';
import { firstValueFrom } from 'rxjs';
import { problemOf } from '../core/api/problem';
import { SessionStore } from '../core/session/session-store';
import { latestVersions } from '../shared/fields/latest-versions';
import { CatalogueApi } from './catalogue-api';
import type { Entry, Kind } from './fields/field';
import { kindView, KIND_VIEWS } from './fields/kind-views';
import { versionsOf } from './versions';

/** What the panel beside the table shows: a type, or the form that makes a new one or the next version. */
export type Open = { readonly mode: 'read'; readonly id: string } | { readonly mode: 'new' } | { readonly mode: 'version'; readonly id: string };

/** The catalogue on the screen: which kind, which type is open, what was refused. */
@Injectable()
export class CatalogueStore {
  private readonly api = inject(CatalogueApi);
  private readonly session = inject(SessionStore);
  private readonly catalogue = signal<Readonly<Record<Kind, readonly Entry[]>> | null>(null);
  private readonly shownKind = signal<Kind>('dispenserTypes');
  private readonly opened = signal<Open | null>(null);
  private readonly notLoaded = signal<Problem | null>(null);
  private readonly notSaved = signal<Problem | null>(null);
  private readonly working = signal(false);

  readonly open = this.opened.asReadonly();
  readonly failed = this.notLoaded.asReadonly();
  readonly refused = this.notSaved.asReadonly();
  readonly saving = this.working.asReadonly();
  readonly loaded = computed(() => this.catalogue() !== null);
  readonly canWrite = computed(() => this.session.can('catalogue:write'));
  readonly view = computed(() => kindView(this.shownKind()));
  readonly kinds = computed(() => KIND_VIEWS.map(({ kind, label }) => ({ value: kind, label, count: latestVersions(this.catalogue()?.[kind] ?? []).length })));
  private readonly entries = computed(() => this.catalogue()?.[this.shownKind()] ?? []);
  readonly latest = computed(() => latestVersions(this.entries()));
  readonly names = computed<ReadonlySet<string>>(() => new Set(this.entries().map((entry) => entry.name)));
  readonly entry = computed(() => {
    const open = this.opened();
    return open && open.mode !== 'new' ? (this.entries().find((entry) => entry.id === open.id) ?? null) : null;
  });
  /** All versions of the open type, the latest first. */
  readonly versions = computed(() => versionsOf(this.entries(), this.entry()?.name ?? ''));

  async load(): Promise<void> {
    this.notLoaded.set(null);
    try {
      this.catalogue.set(await firstValueFrom(this.api.read()));
    } catch (error) {
      this.notLoaded.set(problemOf(error));
    }
  }

  /** Shows another kind; what was open belongs to the former one. */
  show(kind: Kind): void {
    if (kind === this.shownKind()) return;
    this.shownKind.set(kind);
    this.put(null);
  }

  /** Opens a type or a form in the panel; null closes it. */
  put(open: Open | null): void {
    this.opened.set(open);
    this.notSaved.set(null);
  }

  /** Sends a new type or version and opens it. A refusal stays beside the form. */
  async add(body: Readonly<Record<string, unknown>>): Promise<void> {
    const { kind, path } = this.view();
    this.working.set(true);
    this.notSaved.set(null);
    try {
      const added = await firstValueFrom(this.api.add(path, body));
      this.catalogue.update((all) => all && { ...all, [kind]: [...all[kind].filter((entry) => entry.id !== added.id), added] });
      // The same kind may no longer be shown when the answer comes.
      if (this.shownKind() === kind) this.put({ mode: 'read', id: added.id });
    } catch (error) {
      this.notSaved.set(problemOf(error));
    } finally {
      this.working.set(false);
    }
  }
}
