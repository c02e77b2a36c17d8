import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { explainLane, type Finding, formatMetres, formatSection, type LaneFigureName } from '#calc';
import { ProjectStore } from '../../core/project/project-store';
import { Caution, type CautionItem } from '../../shared/caution/caution';
import { ExplainOpener } from '../../shared/explain/explain-opener';
import { ExplainPanel } from '../../shared/explain/explain-panel';
import { FindingItem } from '../../shared/findings/finding-item';
import { type Mend, mendOf } from '../../shared/findings/finding-mend';
import { Icon } from '../../shared/icon/icon';
import { LaneLine } from '../../shared/lane/lane-line';
import { laneViewsOf } from '../../shared/lane/lane-views';
import { LoopDiagram } from '../../shared/lane/loop-diagram';
import { StateGlyph } from '../../shared/lane/state-glyph';
import { EmptyState } from '../../shared/states/empty-state';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { electricRows, planRows } from '../lane-figures/figure-rows';
import { LaneFigures } from '../lane-figures/lane-figures';
import { neighboursOf } from '../lane-neighbours';
import { LaneNeighboursTable } from '../lane-neighbours-table/lane-neighbours-table';
import { laneRowsOf, protectionText } from '../lane-rows';
import { loopViewOf } from '../loop-view-of';

@Component({
  selector: 'lw-lane-page',
  imports: [Caution, EmptyState, ErrorState, ExplainPanel, FindingItem, Icon, LaneFigures, LaneLine, LaneNeighboursTable, LoadingRows, LoopDiagram, MatButton, MatIconButton, RouterLink, StateGlyph],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './lane-page.html',
  styleUrl: './lane-page.css',
})
export class LanePage {
  protected readonly project = inject(ProjectStore);
  private readonly opener = inject(ExplainOpener);
  readonly projectId = input.required<string>();
  readonly dispenserId = input.required<string>();

  protected readonly ready = computed(() => {
    const design = this.project.design();
    const assessment = this.project.assessment();
    return design && assessment ? { design, assessment } : null;
  });
  protected readonly rows = computed(() => {
    const ready = this.ready();
    return ready && laneRowsOf(ready.design, ready.assessment, this.dispenserId());
  });
  protected readonly loop = computed(() => {
    const ready = this.ready();
    const rows = this.rows();
    return ready && rows ? loopViewOf(ready.design, ready.assessment, rows) : null;
  });
  protected readonly plan = computed(() => {
    const ready = this.ready();
    const rows = this.rows();
    return ready && rows ? planRows(ready.design, ready.assessment, rows) : [];
  });
  protected readonly electric = computed(() => {
    const ready = this.ready();
    const rows = this.rows();
    return ready && rows ? electricRows(ready.design, ready.assessment, rows) : [];
  });
  protected readonly findings = computed<readonly Finding[]>(() => this.ready()?.assessment.findingsByLane.get(this.dispenserId()) ?? []);
  protected readonly mends = computed<ReadonlyMap<string, Mend>>(() => {
    const ready = this.ready();
    if (!ready || !this.project.canEdit()) return new Map<string, Mend>();
    return new Map(this.findings().flatMap((finding) => {
      const mend = mendOf(finding, ready.design, ready.assessment);
      return mend ? [[finding.key, mend] as const] : [];
    }));
  });
  protected readonly shown = linkedSignal<string, LaneFigureName | null>({ source: this.dispenserId, computation: () => null });
  protected readonly explanation = computed(() => {
    const ready = this.ready();
    const figure = this.shown();
    return ready && figure ? explainLane(ready.design, ready.assessment, this.dispenserId(), figure) : null;
  });
  protected readonly facts = computed(() => {
    const rows = this.rows();
    if (!rows) return [];
    const { dispenser, type, wiring, circuit, figures } = rows;
    return [
      { label: 'Type', text: type?.name ?? 'not chosen', code: false },
      { label: 'Circuit', text: circuit ? `${circuit.name}, ${protectionText(circuit)}, k = ${circuit.concurrencyLimit ?? 'all'}` : 'none', code: false },
      { label: 'Output, status', text: [figures?.outputAddress ?? 'no output', ...(wiring === 'four-core' ? [figures?.statusAddress ?? 'no status'] : [])].join(', '), code: true },
      { label: 'Own cable', text: `${dispenser.cableTag ?? 'no tag'}, ${formatMetres(dispenser.cableLengthM)}, ${formatSection(dispenser.crossSectionMm2)}`, code: false },
      { label: 'Whole run', text: formatMetres(figures?.runLengthM ?? null), code: false },
    ];
  });
  protected readonly cautions: readonly CautionItem[] = [
    { act: 'Isolate, lock out and prove dead before wiring.', why: 'The machine drive and the 24 V are two isolations.' },
    { act: 'Only a SELV or PELV supply of 24 V.', why: 'Nothing else may feed a dispenser.' },
    { act: 'Keep clear of moving machinery.', why: 'Test-run with guards in place.' },
  ];
  /** The lanes of the same box. */
  protected readonly beside = computed(() => {
    const ready = this.ready();
    const rows = this.rows();
    return ready && rows ? neighboursOf(ready.design, ready.assessment, rows) : null;
  });
  protected readonly line = computed(() => {
    const ready = this.ready();
    return ready ? (laneViewsOf(ready.design, ready.assessment).get(this.dispenserId()) ?? null) : null;
  });
  /** The lane before and after, by tag. */
  protected readonly around = computed(() => {
    const design = this.ready()?.design;
    if (!design) return { before: null, after: null };
    const tags = new Map(design.points.map((p) => [p.id, p.tag]));
    const ids = [...design.dispensers]
      .sort((a, b) => (tags.get(a.pointId) ?? '').localeCompare(tags.get(b.pointId) ?? '', 'en', { numeric: true })).map((d) => d.id);
    const at = ids.indexOf(this.dispenserId());
    return { before: ids[at - 1] ?? null, after: ids[at + 1] ?? null };
  });

  protected mendBy(mend: Mend): void {
    void this.project.edit('circuits', mend.circuitId, { concurrencyLimit: mend.concurrencyLimit });
  }

  protected explain(figure: LaneFigureName): void {
    const next = this.shown() === figure ? null : figure;
    this.shown.set(next);
    const explanation = this.explanation();
    if (explanation && this.opener.show(explanation)) this.shown.set(null);
  }
}
