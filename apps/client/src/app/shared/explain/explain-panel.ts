import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import type { Explanation } from '#calc';
import { Figure } from '../figure/figure';
import { Icon } from '../icon/icon';

/** Why a figure is what it is: formula, inputs with their sources, roundings, and what uses it. */
@Component({
  selector: 'lw-explain-panel',
  imports: [Figure, Icon, MatIconButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './explain-panel.css',
  templateUrl: './explain-panel.html',
})
export class ExplainPanel {
  readonly explanation = input.required<Explanation>();
  readonly closed = output();
}
