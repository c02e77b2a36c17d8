import { BreakpointObserver } from '@angular/cdk/layout';
import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { map } from 'rxjs';
import { ProjectStore } from '../../core/project/project-store';
import { FindingCounts } from '../../shared/findings/finding-counts';
import { FindingMark } from '../../shared/findings/finding-mark';
import { findingLink } from '../../shared/findings/finding-place';
import { Icon } from '../../shared/icon/icon';
import { LaneMarks } from '../../shared/lane/lane-marks';
import { LANE_STATE_WORDS, LANE_STATES } from '../../shared/lane/lane-view';
import { laneViewsOf } from '../../shared/lane/lane-views';
import { StateGlyph } from '../../shared/lane/state-glyph';
import { EmptyState } from '../../shared/states/empty-state';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { PageHead } from '../../shared/states/page-head';
import { needsOf } from './needs';
import { progressOf, sum } from './progress';

const SHOWN_FINDINGS = 60;

/** Where the project stands: progress by cabinet and area, what the checks found, and what waits. */
@Component({
  selector: 'lw-overview-page',
  imports: [EmptyState, ErrorState, FindingCounts, FindingMark, Icon, LaneMarks, LoadingRows, MatButton, PageHead, RouterLink, StateGlyph],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'page' },
  styleUrl: './overview-page.css',
  templateUrl: './overview-page.html',
})
export class OverviewPage {
  protected readonly store = inject(ProjectStore);
  private readonly phone = toSignal(inject(BreakpointObserver).observe('(max-width: 600px)').pipe(map((s) => s.matches)), { initialValue: false });
  protected readonly perRow = computed(() => (this.phone() ? 14 : 20));
  // One column for each state that the project's lanes can have now.
  protected readonly states = LANE_STATES.filter((s) => s !== 'wired');
  protected readonly words = LANE_STATE_WORDS;
  protected readonly linkOf = findingLink;
  protected readonly shownFindings = SHOWN_FINDINGS;
  protected readonly view = computed(() => {
    const [design, assessment] = [this.store.design(), this.store.assessment()];
    if (!design || !assessment) return null;
    const cabinets = progressOf(design, assessment, laneViewsOf(design, assessment));
    return { project: design.project, dispensers: design.dispensers.length, points: design.points.length, cabinets,
      total: sum(cabinets.map((c) => c.counts)), findings: assessment.findings, needs: needsOf(design, assessment) };
  });
}
