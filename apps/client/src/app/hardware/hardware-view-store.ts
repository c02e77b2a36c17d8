import { computed, inject, Injectable } from '@angular/core';
import type { Finding } from '#calc';
import { ProjectStore } from '../core/project/project-store';
import type { Choice } from '../shared/fields/choice';
import { type Mend, mendOf } from '../shared/findings/finding-mend';
import { by, cabinetViews } from './cabinet-views';
import { supplyViews, treeViews } from './supply-views';

/** What the hardware screen shows; the rows themselves belong to the project store. */
@Injectable()
export class HardwareViewStore {
  private readonly project = inject(ProjectStore);
  private readonly state = computed(() => {
    const [design, assessment] = [this.project.design(), this.project.assessment()];
    return design && assessment ? { design, assessment } : null;
  });

  readonly canEdit = this.project.canEdit;
  readonly policies = computed(() => this.state()?.design.project ?? null);
  readonly cabinets = computed(() => this.from(({ design, assessment }) => cabinetViews(design, assessment)));
  readonly supplies = computed(() => this.from(({ design, assessment }) => supplyViews(design, assessment)));
  readonly trees = computed(() => this.from(({ design }) => treeViews(design)));
  readonly circuitChoices = computed(() => this.from(({ design }) =>
    [...design.circuits].sort(by((c) => c.name)).map((c): Choice<string> => ({ value: c.id, label: c.name }))));

  private readonly findings = computed<ReadonlyMap<string, readonly Finding[]>>(() =>
    bySubject(this.state()?.assessment.findings ?? []));
  private readonly mends = computed<ReadonlyMap<string, Mend>>(() => new Map(this.from(({ design, assessment }) =>
    assessment.findings.flatMap((finding) => {
      const mend = this.canEdit() ? mendOf(finding, design, assessment) : null;
      return mend ? [[finding.key, mend] as const] : [];
    }))));

  /** What the checks found about a row, by its id (a group's is its key). */
  findingsOf(subjectId: string): readonly Finding[] {
    return this.findings().get(subjectId) ?? [];
  }

  /** The edit that mends a finding by itself. */
  mendOf(finding: Finding): Mend | null {
    return this.mends().get(finding.key) ?? null;
  }

  mend({ circuitId, concurrencyLimit }: Mend): void {
    void this.project.edit('circuits', circuitId, { concurrencyLimit });
  }

  /** Saves fields of one row. */
  edit(collection: Parameters<ProjectStore['edit']>[0], id: string, values: Readonly<Record<string, unknown>>): void {
    void this.project.edit(collection, id, values);
  }

  private from<T>(read: (state: NonNullable<ReturnType<typeof this.state>>) => readonly T[]): readonly T[] {
    const state = this.state();
    return state ? read(state) : [];
  }
}

function bySubject(findings: readonly Finding[]): ReadonlyMap<string, readonly Finding[]> {
  const map = new Map<string, Finding[]>();
  for (const finding of findings) map.set(finding.subject.id, [...(map.get(finding.subject.id) ?? []), finding]);
  return map;
}
