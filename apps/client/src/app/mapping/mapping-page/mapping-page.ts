import { ChangeDetectionStrategy, Component, computed, inject, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { ProjectStore } from '../../core/project/project-store';
import { Segmented } from '../../shared/controls/segmented';
import type { Mend } from '../../shared/findings/finding-mend';
import { Icon } from '../../shared/icon/icon';
import { EmptyState } from '../../shared/states/empty-state';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { PageHead } from '../../shared/states/page-head';
import { ChannelPanel } from '../channel-panel/channel-panel';
import { ChannelStrip } from '../channel-strip/channel-strip';
import { ChannelTable } from '../channel-table/channel-table';
import { MappingViewStore, type Shown } from '../mapping-view-store';
import { PreviewPanel } from '../preview-panel/preview-panel';
import { UnmappedList } from '../unmapped-list/unmapped-list';

@Component({
  selector: 'lw-mapping-page',
  imports: [ChannelPanel, ChannelStrip, ChannelTable, EmptyState, ErrorState, Icon, LoadingRows, MatButton, MatMenu, MatMenuItem, MatMenuTrigger, PageHead, PreviewPanel, RouterLink, Segmented, UnmappedList],
  providers: [MappingViewStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:keydown.alt.a)': 'preview($event)', '(document:keydown.escape)': 'view.discardPreview()' },
  templateUrl: './mapping-page.html',
  styleUrl: './mapping-page.css',
})
export class MappingPage {
  protected readonly project = inject(ProjectStore);
  protected readonly view = inject(MappingViewStore);
  private readonly table = viewChild(ChannelTable);

  protected readonly kinds: readonly { readonly value: Shown; readonly label: string }[] = [
    { value: 'output', label: 'Outputs' }, { value: 'input', label: 'Inputs' }, { value: 'both', label: 'Both' },
  ];
  protected readonly projectId = computed(() => this.project.document()?.project.id ?? '');
  protected readonly listUrl = computed(() => `/api/v1/projects/${this.projectId()}/documents/io-list`);
  protected readonly sentence = computed(() => {
    const c = this.view.counts();
    return `${c.mapped} of ${c.dispensers} dispensers mapped. ${c.cabinets} cabinets, ${c.modules} modules.`;
  });

  protected readonly nothingOpen = computed(() => {
    if (this.project.design()?.dispensers.length === 0) return 'No dispensers yet: import the tag list, or enter points.';
    return this.view.open().length === 0 ? 'Every dispenser has its channels.' : 'No dispenser without a channel meets the filter.';
  });

  protected preview(event?: Event): void {
    event?.preventDefault();
    if (!this.view.canEdit() || this.view.open().length === 0) return;
    this.view.previewAutoAssign();
    setTimeout(() => this.table()?.goToProposed());
  }

  protected show(kind: string): void {
    this.view.shown.set(kind as Shown);
  }

  protected goTo(moduleId: string): void {
    const type = this.view.cabinets().flatMap((c) => c.modules).find((m) => m.module.id === moduleId)?.type;
    if (type && this.view.shown() !== 'both') this.view.shown.set(type.kind);
    setTimeout(() => this.table()?.goTo(moduleId));
  }

  protected mend(mend: Mend): void {
    void this.project.edit('circuits', mend.circuitId, { concurrencyLimit: mend.concurrencyLimit });
  }
}
