import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { Figure } from '../../shared/figure/figure';
import { Icon } from '../../shared/icon/icon';
import type { Entry, KindView } from '../fields/field';
import { fieldText, formValueOf, isAsked } from '../fields/field-values';

/** One version of a type: every field with what it means, and the other versions. */
@Component({
  selector: 'lw-type-panel',
  imports: [Figure, Icon, MatButton, MatIconButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './type-panel.html',
  styleUrl: './type-panel.css',
})
export class TypePanel {
  readonly view = input.required<KindView>();
  readonly entry = input.required<Entry>();
  /** All versions of this name, the latest first. */
  readonly versions = input.required<readonly Entry[]>();
  readonly editable = input(false);
  readonly picked = output<string>();
  readonly versionAsked = output();
  readonly closed = output();

  /** Fields that mean nothing for this type are left out, and groups that have none left. */
  protected readonly groups = computed(() => {
    const values = formValueOf(this.view(), this.entry());
    return this.view().groups
      .map(({ title, fields }) => ({ title, rows: fields.filter((field) => isAsked(this.view(), field, values)).map((field) => ({ field, text: fieldText(field, this.entry()) })) }))
      .filter((group) => group.rows.length > 0);
  });
}
