import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Finding, Severity } from '#calc';
import { FindingMark } from './finding-mark';

export const SEVERITIES: readonly Severity[] = ['error', 'warning', 'note'];

/** How many of each severity, `error 4, warning 5, note 2`. */
@Component({
  selector: 'lw-finding-counts',
  imports: [FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: ':host { display: inline-flex; gap: 10px; align-items: center; font: var(--mat-sys-body-small); white-space: nowrap; } span { display: inline-flex; gap: 4px; align-items: center; }',
  template: `
    @for (row of rows(); track row.severity) {
      <span><lw-finding-mark [kind]="row.severity" />{{ row.count }}</span>
    }`,
})
export class FindingCounts {
  readonly findings = input.required<readonly Finding[]>();
  protected readonly rows = computed(() =>
    SEVERITIES.map((severity) => ({ severity, count: this.findings().filter((f) => f.severity === severity).length })));
}
