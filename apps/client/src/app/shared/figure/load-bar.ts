import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ampsAgainstMaximum, formatAmps } from '#calc';

/** A load against its rating; what lies over the rating is hatched. */
@Component({
  selector: 'lw-load-bar',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'img', '[attr.aria-label]': 'words()' },
  styles: `
    :host { display: inline-block; position: relative; width: 120px; height: 8px; vertical-align: middle; background: var(--mat-sys-surface-container-highest); }
    i { position: absolute; inset: 0 auto 0 0; background: var(--mat-sys-secondary); }
    .over { background: repeating-linear-gradient(135deg, var(--mat-sys-error) 0 2px, transparent 2px 4px), color-mix(in srgb, var(--mat-sys-error) 35%, transparent); }
    u { position: absolute; top: -3px; bottom: -3px; width: 2px; margin-left: -1px; background: var(--mat-sys-on-surface); }`,
  template: `
    <i [style.width.%]="within()"></i>
    @if (over() > 0) { <i class="over" [style.left.%]="limit()" [style.width.%]="over()"></i> }
    @if (rating() !== null) { <u [style.left.%]="limit()"></u> }`,
})
export class LoadBar {
  /** Load and rating, A; no rating: the bar has no mark. */
  readonly value = input.required<number>();
  readonly rating = input.required<number | null>();
  /** What the whole bar stands for, A; left out: a little more than the larger of the two. */
  readonly scale = input<number | null>(null);
  private readonly full = computed(() => this.scale() ?? Math.max(this.value(), (this.rating() ?? 0) * 1.15, Number.MIN_VALUE));
  protected readonly limit = computed(() => percent(this.rating() ?? 0, this.full()));
  protected readonly within = computed(() => percent(Math.min(this.value(), this.rating() ?? this.value()), this.full()));
  protected readonly over = computed(() => {
    const rating = this.rating();
    return rating === null ? 0 : Math.min(100 - this.limit(), percent(Math.max(0, this.value() - rating), this.full()));
  });
  protected readonly words = computed(() => {
    const rating = this.rating();
    const load = ampsAgainstMaximum(this.value());
    return rating === null ? load : `${load} of ${formatAmps(rating)}${this.value() > rating ? ', over the rating' : ''}`;
  });
}

const percent = (part: number, whole: number): number => Math.min(100, (100 * part) / whole);
