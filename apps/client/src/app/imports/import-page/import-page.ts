import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { RouterLink } from '@angular/router';
import { problemText } from '../../core/api/problem';
import { ProjectStore } from '../../core/project/project-store';
import { Segmented } from '../../shared/controls/segmented';
import { ErrorState } from '../../shared/states/error-state';
import { Notice } from '../../shared/states/notice';
import { PageHead } from '../../shared/states/page-head';
import { ColumnList } from '../column-list/column-list';
import { FileDrop } from '../file-drop/file-drop';
import { ImportViewStore } from '../import-view-store';
import { RowTable } from '../row-table/row-table';

@Component({
  selector: 'lw-import-page',
  imports: [ColumnList, ErrorState, FileDrop, MatButton, MatProgressBar, Notice, RouterLink, PageHead, RowTable, Segmented],
  providers: [ImportViewStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './import-page.html',
  styleUrl: './import-page.css',
})
export class ImportPage {
  protected readonly project = inject(ProjectStore);
  protected readonly store = inject(ImportViewStore);
  protected readonly problemText = problemText;
  protected readonly projectId = computed(() => this.project.document()?.project.id ?? '');
  protected readonly sub = computed(() => {
    const preview = this.store.preview();
    return preview ? `${preview.fileName}, ${preview.counts.rows} rows` : '';
  });
  protected readonly used = computed(() => Object.keys(this.store.mapping()).length);
  protected readonly act = computed(() => {
    const counts = this.store.preview()?.counts;
    if (!counts || this.store.writes() === 0) return 'Nothing to import';
    const parts = [counts.toCreate > 0 ? `create ${counts.toCreate}` : '', counts.toUpdate > 0 ? `change ${counts.toUpdate}` : ''];
    return `Import: ${parts.filter(Boolean).join(', ')}`;
  });
}
