import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A page's head: its name, a quiet line beside it, and its acts (content) at the right. */
@Component({
  selector: 'lw-page-head',
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    :host { display: flex; flex: none; align-items: center; gap: 16px; min-width: 0; min-height: 58px; padding: 12px var(--lw-gutter) 12px; }
    .sub { min-width: 0; overflow: hidden; text-overflow: ellipsis; white-space: nowrap; font: var(--mat-sys-body-small); color: var(--mat-sys-on-surface-variant); }
    h1 { white-space: nowrap; }
    .tools { display: flex; flex: none; align-items: center; gap: 8px; margin-left: auto; }
    @media (max-width: 600px) {
      :host { flex-wrap: wrap; gap: 6px 12px; }
      h1 { white-space: normal; }
      .sub { flex-basis: 100%; order: 3; white-space: normal; }
    }`,
  template: `
    <h1>{{ title() }}</h1>
    @if (sub()) { <span class="sub">{{ sub() }}</span> }
    <div class="tools"><ng-content /></div>`,
})
export class PageHead {
  readonly title = input.required<string>();
  readonly sub = input('');
}
