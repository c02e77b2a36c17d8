import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** WARNING can kill or maim, CAUTION can hurt or damage. */
export type SignalWord = 'WARNING' | 'CAUTION';

export interface CautionItem {
  /** The act, `Lock the drive.` */
  readonly act: string;
  /** Why, `The belt can start at any time.` */
  readonly why: string;
}

/** A safety caution with the general warning sign of ISO 7010 (W001); never used for a finding. */
@Component({
  selector: 'lw-caution',
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: ':host { display: block; } .sign { fill: var(--lw-safety); stroke: var(--lw-safety); } .edge { stroke: var(--lw-on-safety); fill: none; }',
  template: `
    <section class="caution" [attr.aria-label]="word()">
      <header>
        <svg class="w001" viewBox="0 0 34 30" role="img" aria-label="general warning sign">
          <path class="sign" stroke-width="4.4" stroke-linejoin="round" d="M17 2.4L31.8 27.6H2.2z" />
          <path class="edge" stroke-width="2.3" stroke-linejoin="round" d="M17 3.6L30.2 26.4H3.8z" />
          <path class="edge" stroke-width="3" d="M17 10.4v8M17 20.8v2.9" />
        </svg>
        <span>{{ word() }}</span>
      </header>
      <ul>
        @for (item of items(); track item.act) { <li><b>{{ item.act }}</b> {{ item.why }}</li> }
      </ul>
    </section>`,
})
export class Caution {
  readonly word = input.required<SignalWord>();
  readonly items = input.required<readonly CautionItem[]>();
}
