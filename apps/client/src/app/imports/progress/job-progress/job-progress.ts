import { ChangeDetectionStrategy, Component, computed, input, linkedSignal, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { amountWords, type ImportProgress, leftWords, percent, spoken, stageWords } from '../progress-words';

const SAY_EVERY_MS = 10_000;

interface Saying {
  readonly stage: ImportProgress['stage'];
  readonly atMs: number;
  readonly text: string;
}

/** How far a job is, with the way to stop it. Those who listen hear each stage, and every ten seconds how far it is. */
@Component({
  selector: 'lw-job-progress',
  imports: [MatButton, MatProgressBar],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './job-progress.css',
  template: `
    @let now = progress();
    <p class="says">
      <b>{{ stage() }}</b><span>{{ amount() }}</span><span class="quiet left">{{ left() }}</span>
    </p>
    <button matButton="outlined" type="button" [disabled]="now.stage === 'stopping'" (click)="cancelled.emit()">{{ cancelLabel() }}</button>
    <mat-progress-bar [mode]="value() === null ? 'indeterminate' : 'determinate'" [value]="value() ?? 0" [attr.aria-label]="label()" [attr.aria-valuetext]="words()" />
    <span class="sr" aria-live="polite">{{ said().text }}</span>`,
})
export class JobProgress {
  readonly progress = input.required<ImportProgress>();
  /** What the bar is of, for those who listen. */
  readonly label = input.required<string>();
  readonly cancelLabel = input('Cancel');
  readonly cancelled = output();

  protected readonly stage = computed(() => stageWords(this.progress().stage));
  protected readonly amount = computed(() => amountWords(this.progress()));
  protected readonly left = computed(() => leftWords(this.progress().leftMs));
  protected readonly value = computed(() => percent(this.progress()));
  protected readonly words = computed(() => spoken(this.progress()));
  protected readonly said = linkedSignal<ImportProgress, Saying>({
    source: this.progress,
    computation: (progress, before) => {
      const atMs = performance.now();
      const last = before?.value;
      if (last && last.stage === progress.stage && atMs - last.atMs < SAY_EVERY_MS) return last;
      return { stage: progress.stage, atMs, text: spoken(progress) };
    },
  });
}
