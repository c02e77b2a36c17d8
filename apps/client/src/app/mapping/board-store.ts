import { computed, inject, Injectable, linkedSignal, signal } from '@angular/core';
import type { Assessment } from '#calc';
import { ProjectStore } from '../core/project/project-store';
import type { LaneView } from '../shared/lane/lane-view';
import { laneViewsOf } from '../shared/lane/lane-views';
import { type Board, boardOf } from './board';
import { keptLanes } from './lane-memory';
import { type OpenLane, openLanes } from './open-lanes';

/** The open project as the mapping reads it. What reads as before stays the same object from one state to the next. */
@Injectable()
export class BoardStore {
  private readonly project = inject(ProjectStore);
  readonly canEdit = this.project.canEdit;
  /** Whether status inputs follow what is done with outputs. */
  readonly withStatus = signal(false);

  readonly board = computed<Board | null>(() => {
    const design = this.project.design();
    return design && boardOf(design);
  });
  readonly assessment = this.project.assessment;
  /** The drawing of each lane, by dispenser id. */
  readonly lanes = linkedSignal<{ board: Board | null; assessment: Assessment | null }, ReadonlyMap<string, LaneView>>({
    source: () => ({ board: this.board(), assessment: this.assessment() }),
    computation: ({ board, assessment }, before) =>
      board && assessment ? keptLanes(laneViewsOf(board.design, assessment), before?.value) : new Map<string, LaneView>(),
  });
  readonly open = linkedSignal<{ board: Board | null; assessment: Assessment | null }, readonly OpenLane[]>({
    source: () => ({ board: this.board(), assessment: this.assessment() }),
    computation: ({ board, assessment }, before) => (board && assessment ? openLanes(board, assessment, before?.value) : []),
  });
}
