import { computed, inject, Injectable, signal } from '@angular/core';
import { type AutoAssignment, autoAssign, type Purpose } from '#calc';
import { v7 as newId } from 'uuid';
import { ProjectStore } from '../core/project/project-store';
import { BoardStore } from './board-store';
import type { Proposal } from './mapping-rows';
import { changesOf } from './moves/drop-plan';
import { purposeOf } from './moves/drop-rules';
import { targetOf } from './moves/drop-target';
import { type Fill, type FillOrder, inOrder, planFill } from './moves/fill-order';
import { type LoadsAfter, loadsAfter } from './moves/load-after';
import { lacking } from './open-lanes';

/** A group or module to be filled, from those chosen or, where none is, from all that lack its signal. */
export interface Filling {
  readonly targetKey: string;
  readonly order: FillOrder;
  readonly chosen: readonly string[];
}

/** What auto-assignment or a filling would do, shown before anything is saved. */
@Injectable()
export class PreviewStore {
  private readonly project = inject(ProjectStore);
  private readonly store = inject(BoardStore);
  readonly auto = signal<AutoAssignment | null>(null);
  readonly filling = signal<Filling | null>(null);

  readonly fill = computed<Fill | null>(() => {
    const filling = this.filling();
    const board = this.store.board();
    const assessment = this.store.assessment();
    const target = filling && targetOf(filling.targetKey);
    if (!filling || !board || !assessment || !target || target.kind === 'unmapped') return null;
    const rack = board.moduleOf.get(target.moduleId);
    const ids = filling.chosen.length > 0 ? filling.chosen : this.lackingIds(rack ? purposeOf(rack.type) : 'control');
    return planFill(board, inOrder(board, assessment, ids, filling.order), target, this.store.withStatus());
  });
  readonly fillLoads = computed<LoadsAfter | null>(() => {
    const plan = this.fill()?.plan;
    const board = this.store.board();
    const assessment = this.store.assessment();
    return plan && plan.kind !== 'refused' && board && assessment ? loadsAfter(board, assessment, plan) : null;
  });
  readonly proposals = computed<readonly Proposal[]>(() => {
    const plan = this.fill()?.plan;
    return this.auto()?.proposed ?? (plan && plan.kind !== 'refused' ? plan.placements : []);
  });
  readonly active = computed(() => this.auto() !== null || this.filling() !== null);

  startAuto(dispenserIds: readonly string[]): void {
    const design = this.project.design();
    if (!design) return;
    this.filling.set(null);
    this.auto.set(autoAssign(design, dispenserIds.length > 0 ? dispenserIds : undefined));
  }

  startFill(targetKey: string, chosen: readonly string[]): void {
    this.auto.set(null);
    this.filling.set({ targetKey, order: 'tag', chosen });
  }

  discard(): void {
    this.auto.set(null);
    this.filling.set(null);
  }

  /** Applies what is shown as one change set; answers whether there was something to apply. */
  async accept(): Promise<void> {
    const auto = this.auto();
    const plan = this.fill()?.plan;
    this.discard();
    if (auto && auto.proposed.length > 0) {
      await this.project.apply(`Mapping of ${dispensersOf(auto.proposed)} by auto-assignment`, auto.proposed.map((values) => ({
        collection: 'assignments' as const, op: 'create' as const, id: newId(), values: { ...values },
      })));
    } else if (plan && plan.kind !== 'refused') {
      await this.project.apply(plan.summary, changesOf(plan));
    }
  }

  private lackingIds(purpose: Purpose): readonly string[] {
    return this.store.open().filter((lane) => lacking(lane, purpose)).map((lane) => lane.dispenser.id);
  }
}

function dispensersOf(proposals: readonly Proposal[]): string {
  const count = new Set(proposals.map((p) => p.dispenserId)).size;
  return count === 1 ? 'one dispenser' : `${count} dispensers`;
}
