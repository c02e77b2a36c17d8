import { BreakpointObserver } from '@angular/cdk/layout';
import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { map } from 'rxjs';
import { ProjectStore } from '../../core/project/project-store';
import { Icon } from '../../shared/icon/icon';
import { ErrorState } from '../../shared/states/error-state';
import { Notice } from '../../shared/states/notice';
import { PageHead } from '../../shared/states/page-head';
import { ColumnList } from '../column-list/column-list';
import { FileDrop } from '../file-drop/file-drop';
import { ImportResult } from '../import-result/import-result';
import { ImportViewStore } from '../import-view-store';
import { actWords, effectWords, fileWords } from '../import-words';
import { JobProgress } from '../progress/job-progress/job-progress';
import { WorkWatch } from '../progress/work-watch';
import { ReadingSettings } from '../reading-settings/reading-settings';
import { ImportRows } from '../rows/import-rows';
import { RowsPanel } from '../rows/rows-panel/rows-panel';
import { SheetList } from '../sheet-list/sheet-list';
import { ValueList } from '../value-list/value-list';

/** A tag list on its way into the project: file, columns and check, import. */
@Component({
  selector: 'lw-import-page',
  imports: [
    ColumnList, ErrorState, FileDrop, Icon, ImportResult, JobProgress, MatButton, NgTemplateOutlet, Notice, PageHead, ReadingSettings, RowsPanel, SheetList,
    ValueList,
  ],
  providers: [ImportViewStore, ImportRows, WorkWatch],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './import-page.html',
  styleUrl: './import-page.css',
})
export class ImportPage {
  protected readonly project = inject(ProjectStore);
  protected readonly store = inject(ImportViewStore);
  protected readonly phone = toSignal(inject(BreakpointObserver).observe('(max-width: 600px)').pipe(map((state) => state.matches)), { initialValue: false });
  protected readonly projectId = computed(() => this.project.document()?.project.id ?? '');
  protected readonly sub = computed(() => {
    const preview = this.store.preview();
    return preview ? fileWords(preview) : '';
  });
  protected readonly used = computed(() => Object.keys(this.store.mapping()).length);
  protected readonly act = computed(() => {
    const counts = this.store.preview()?.counts;
    return counts ? actWords(counts) : '';
  });
  protected readonly effect = computed(() => {
    const counts = this.store.preview()?.counts;
    return counts ? effectWords(counts) : '';
  });
  /** The import itself is under way: nothing can be set any more. */
  protected readonly locked = computed(() => this.store.job() === 'commit');
  protected readonly step = computed(() => (this.store.result() ? 3 : this.store.preview() ? 2 : 1));
}
