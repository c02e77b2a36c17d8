import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { ampsAgainstMaximum } from '#calc';
import { ProjectStore } from '../../core/project/project-store';
import { LoadBar } from '../../shared/figure/load-bar';
import { FindingMark } from '../../shared/findings/finding-mark';
import { type Mend, mendOf } from '../../shared/findings/finding-mend';
import { Icon } from '../../shared/icon/icon';
import { LaneLine } from '../../shared/lane/lane-line';
import { ChannelFinder } from '../channel-finder/channel-finder';
import type { ChannelRow, GroupSection } from '../mapping-rows';
import { MappingViewStore } from '../mapping-view-store';
import { MoveStore } from '../moves/move-store';
import { lacking, type OpenLane } from '../open-lanes';
import { PreviewStore } from '../preview-store';

/** What is typed to find a dispenser, and in which channel. */
export interface Searching {
  readonly key: string;
  readonly first: string;
}

/** A group of channels with its load, its findings and its rows. Keys, clicks and drags are heard by the table. */
@Component({
  selector: 'lw-channel-section',
  imports: [ChannelFinder, FindingMark, Icon, LaneLine, LoadBar, MatButton, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './channel-section.html',
  styleUrl: './channel-section.css',
})
export class ChannelSection {
  private readonly project = inject(ProjectStore);
  private readonly previews = inject(PreviewStore);
  protected readonly view = inject(MappingViewStore);
  protected readonly move = inject(MoveStore);
  readonly section = input.required<GroupSection>();
  readonly open = input.required<readonly OpenLane[]>();
  readonly editable = input.required<boolean>();
  readonly projectId = input.required<string>();
  /** Key of the row that the Tab key reaches. */
  readonly tabStop = input.required<string | null>();
  readonly searching = input.required<Searching | null>();
  readonly chosen = output<{ readonly lane: OpenLane; readonly row: ChannelRow }>();
  readonly left = output<ChannelRow>();
  readonly fillAsked = output<string>();
  readonly mended = output<Mend>();

  protected readonly upTo = ampsAgainstMaximum;
  /** The group's load before and after what is being moved or filled. */
  protected readonly change = computed(() => {
    const loads = this.move.loads() ?? this.previews.fillLoads();
    return loads?.groups.find((g) => g.key === this.section().key && g.beforeA !== g.afterA) ?? null;
  });
  protected readonly fillable = computed(() => {
    const [first] = this.section().channels;
    return this.section().free > 0 && this.open().some((lane) => lacking(lane, first.purpose));
  });
  /** Edits that would mend a finding by themselves, by the finding's key. */
  protected readonly mends = computed<ReadonlyMap<string, Mend>>(() => {
    const design = this.project.design();
    const assessment = this.project.assessment();
    if (!design || !assessment || !this.project.canEdit()) return new Map<string, Mend>();
    return new Map(this.section().findings.flatMap((finding) => {
      const mend = mendOf(finding, design, assessment);
      return mend ? [[finding.key, mend] as const] : [];
    }));
  });
}
