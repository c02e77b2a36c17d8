import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormField } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { RouterLink } from '@angular/router';
import type { Finding } from '#calc';
import { ProjectStore } from '../../core/project/project-store';
import { Segmented } from '../../shared/controls/segmented';
import { SEVERITIES } from '../../shared/findings/finding-counts';
import { FindingMark } from '../../shared/findings/finding-mark';
import { type Mend, mendOf } from '../../shared/findings/finding-mend';
import { findingLink, findingPlace } from '../../shared/findings/finding-place';
import { EmptyState } from '../../shared/states/empty-state';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { PageHead } from '../../shared/states/page-head';
import { codesOf, filtered, FOLD_FROM, type FindingRun, runsOf } from './finding-filter';

const WORDS = { error: 'Errors', warning: 'Warnings', note: 'Notes' } as const;
const PLACES = { points: 'Points', mapping: 'Mapping', hardware: 'Hardware' } as const;
const STEP = 200;
const NAMED = 8;

/** Everything that the checks noticed, with the numbers compared, the source and what would mend it. */
@Component({
  selector: 'lw-findings-page',
  imports: [EmptyState, ErrorState, FindingMark, LoadingRows, MatButton, MatFormField, MatInput, MatOption, MatSelect, PageHead, RouterLink, Segmented],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'page' },
  styleUrl: './findings-page.css',
  templateUrl: './findings-page.html',
})
export class FindingsPage {
  protected readonly store = inject(ProjectStore);
  protected readonly severity = signal('all');
  protected readonly code = signal('');
  protected readonly text = signal('');
  protected readonly most = signal(STEP);
  private readonly opened = signal<ReadonlySet<string>>(new Set());
  protected readonly runsOf = runsOf;
  protected readonly words = WORDS;
  protected readonly step = STEP;
  private readonly findings = computed(() => this.store.assessment()?.findings ?? []);
  protected readonly projectId = computed(() => this.store.document()?.project.id ?? '');
  protected readonly codes = computed(() => codesOf(this.findings()));
  protected readonly groups = computed(() => filtered(this.findings(), { severity: this.severity(), code: this.code(), text: this.text() }));
  protected readonly count = computed(() => this.groups().reduce((n, g) => n + g.findings.length, 0));
  protected readonly total = computed(() => this.findings().length);
  protected readonly segments = computed(() => [
    { value: 'all', label: 'All', count: this.total() },
    ...SEVERITIES.map((s) => ({ value: s, label: WORDS[s], count: this.findings().filter((f) => f.severity === s).length })),
  ]);

  protected link(finding: Finding): readonly string[] {
    return ['/projects', this.projectId(), ...findingLink(finding)];
  }

  protected linkWord(finding: Finding): string {
    return findingLink(finding)[0] === 'lanes' ? 'Lane' : PLACES[findingPlace(finding)];
  }

  /** Many that say the same stand in one row until it is opened. */
  protected folded(run: FindingRun): boolean {
    return run.findings.length >= FOLD_FROM && !this.opened().has(run.key);
  }

  protected labels(run: FindingRun): string {
    const labels = run.findings.map((f) => f.subject.label);
    return labels.length > NAMED ? `${labels.slice(0, NAMED).join(', ')} and ${labels.length - NAMED} more` : labels.join(', ');
  }

  protected open(run: FindingRun): void {
    this.opened.update((keys) => new Set([...keys, run.key]));
  }

  protected mendOf(finding: Finding): Mend | null {
    const design = this.store.design();
    const assessment = this.store.assessment();
    return design && assessment && this.store.canEdit() ? mendOf(finding, design, assessment) : null;
  }

  protected mend(mend: Mend): void {
    void this.store.edit('circuits', mend.circuitId, { concurrencyLimit: mend.concurrencyLimit });
  }
}
