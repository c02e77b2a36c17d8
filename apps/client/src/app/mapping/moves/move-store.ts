import { LiveAnnouncer } from '@angular/cdk/a11y';
import { computed, inject, Injectable, signal } from '@angular/core';
import { ProjectStore } from '../../core/project/project-store';
import { channelKey } from '../board';
import { BoardStore } from '../board-store';
import { NONE } from '../selection';
import { MappingViewStore } from '../mapping-view-store';
import { changesOf, type DropPlan, planDrop, planFreeing, planSwap } from './drop-plan';
import { type Cargo, type DropTarget, targetOf, UNMAPPED } from './drop-target';
import { firstTarget } from './first-target';
import { type LoadsAfter, loadsAfter } from './load-after';
import { cargoWords, doneWords, ghostsOf, stopWords } from './plan-words';

export interface Move {
  readonly cargo: Cargo;
  /** By the keyboard each stop is said; by the pointer a chip follows it; a form shows it beside its fields. */
  readonly by: 'keys' | 'pointer' | 'form';
  /** Key of the row where it was picked up, to go back to. */
  readonly from: string;
}

/** What is being moved, over which target, and what would come of it. Nothing changes before `drop`. */
@Injectable()
export class MoveStore {
  private readonly project = inject(ProjectStore);
  private readonly store = inject(BoardStore);
  private readonly view = inject(MappingViewStore);
  private readonly announcer = inject(LiveAnnouncer);
  readonly move = signal<Move | null>(null);
  readonly aimed = signal<string | null>(null);
  /** Why the last drop was refused, until something else is done. */
  readonly refused = signal<string | null>(null);

  readonly target = computed<DropTarget | null>(() => {
    const key = this.aimed();
    return key === null ? null : targetOf(key);
  });
  readonly plan = computed<DropPlan | null>(() => {
    const [board, move, target] = [this.store.board(), this.move(), this.target()];
    return board && move && target && planDrop(board, move.cargo, target, this.store.withStatus());
  });
  readonly loads = computed<LoadsAfter | null>(() => this.loadsOf(this.plan()));
  readonly ghosts = computed(() => {
    const board = this.store.board();
    return board ? ghostsOf(board, this.plan()) : new Map<string, string>();
  });
  /** Channels that would be left. */
  readonly leaving = computed<ReadonlySet<string>>(() => {
    const plan = this.plan();
    return new Set(plan && plan.kind !== 'refused' ? plan.freed.map((row) => channelKey(row.moduleId, row.channel)) : []);
  });
  readonly carrying = computed(() => this.move()?.by === 'keys');

  /** Picks up; the keyboard begins over the first channel that takes the first of them. */
  lift(move: Move): void {
    const board = this.store.board();
    if (!board || move.cargo.dispenserIds.length === 0) return;
    this.refused.set(null);
    this.move.set(move);
    const first = firstTarget(board, move.cargo, this.view.shown());
    if (move.by === 'pointer') return this.aimed.set(null);
    const rack = first && board.moduleOf.get(first.moduleId);
    if (rack) this.view.reveal(rack.type.kind);
    this.aimed.set(first?.key ?? null);
    if (move.by !== 'keys') return;
    const where = first ? this.words() : 'No free channel is in sight.';
    this.say(`${cargoWords(board, move.cargo)} picked up. Arrow keys choose a channel, Page keys a group, Enter places, Delete unmaps, Escape cancels. ${where}`);
  }

  aim(key: string | null): void {
    if (this.aimed() === key) return;
    this.aimed.set(key);
    if (this.carrying() && key !== null) this.say(this.words());
  }

  /** Says again what Enter would do, after something else than the target changed. */
  repeat(): void {
    if (this.carrying() && this.aimed() !== null) this.say(this.words());
  }

  cancel(): void {
    const move = this.move();
    if (!move) return;
    this.move.set(null);
    this.aimed.set(null);
    if (move.by !== 'form') this.say('Cancelled; nothing has changed.');
  }

  /** Does what the plan says, as one change set. A refusal is said and leaves all as it is; the keyboard keeps its load. */
  drop(): boolean {
    const [move, plan, target] = [this.move(), this.plan(), this.target()];
    if (!move || !plan || !target || plan.kind === 'refused') {
      if (move?.by !== 'keys') this.end();
      if (plan?.kind === 'refused') this.refuse(plan.reason);
      else this.say('Cancelled; nothing has changed.');
      return false;
    }
    this.end();
    this.commit(plan, target);
    return true;
  }

  /** Unmaps what is carried. */
  dropOnList(): void {
    this.aimed.set('unmapped');
    this.drop();
  }

  /** Drops on a target in one step, without a preview. */
  put(cargo: Cargo, target: DropTarget): void {
    const board = this.store.board();
    if (board) this.commit(planDrop(board, cargo, target, this.store.withStatus()), target);
  }

  /** Frees mapped channels of either kind, by their keys. */
  unmap(keys: Iterable<string>): void {
    const board = this.store.board();
    if (board) this.commit(planFreeing(board, [...keys].flatMap((key) => board.taken.get(key) ?? []), this.store.withStatus()), UNMAPPED);
  }

  /** Two mapped dispensers change places. */
  swap(a: string, b: string, purpose: 'control' | 'status'): void {
    const board = this.store.board();
    if (board) this.commit(planSwap(board, a, b, purpose, this.store.withStatus()), UNMAPPED);
  }

  say(words: string): void {
    void this.announcer.announce(words, 'polite');
  }

  private commit(plan: DropPlan, target: DropTarget): void {
    const board = this.store.board();
    if (!board) return;
    if (plan.kind === 'refused') return this.refuse(plan.reason);
    this.refused.set(null);
    const words = doneWords(board, plan, target, this.loadsOf(plan));
    this.view.channelSelection.set(NONE);
    void this.project.apply(plan.summary, changesOf(plan));
    this.say(words);
  }

  private refuse(reason: string): void {
    this.refused.set(reason);
    this.say(`Not possible: ${reason}`);
  }

  private end(): void {
    this.move.set(null);
    this.aimed.set(null);
  }

  private words(): string {
    const [board, move, target, plan] = [this.store.board(), this.move(), this.target(), this.plan()];
    return board && move && target && plan ? stopWords(board, move.cargo, target, plan, this.loads()) : '';
  }

  private loadsOf(plan: DropPlan | null): LoadsAfter | null {
    const [board, assessment] = [this.store.board(), this.store.assessment()];
    return plan && plan.kind !== 'refused' && board && assessment ? loadsAfter(board, assessment, plan) : null;
  }
}
