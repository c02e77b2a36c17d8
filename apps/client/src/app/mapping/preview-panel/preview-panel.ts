import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { autoAssign, Design } from '#calc';

/** What auto-assignment would do: placed, not placed and why. Nothing is saved until it is accepted. */
@Component({
  selector: 'lw-preview-panel',
  imports: [MatButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './preview-panel.html',
  styleUrl: './preview-panel.css',
})
export class PreviewPanel {
  readonly proposal = input.required<ReturnType<typeof autoAssign>>();
  readonly design = input.required<Design>();
  readonly accepted = output<void>();
  readonly discarded = output<void>();

  private readonly tags = computed(() => {
    const points = new Map(this.design().points.map((p) => [p.id, p.tag]));
    return new Map(this.design().dispensers.map((d) => [d.id, points.get(d.pointId) ?? '']));
  });
  protected readonly lanes = computed(() => new Set(this.proposal().proposed.map((p) => p.dispenserId)).size);
  protected readonly unplaced = computed(() => {
    const byReason = new Map<string, string[]>();
    for (const u of this.proposal().unplaced) {
      const tags = byReason.get(u.reason) ?? [];
      byReason.set(u.reason, [...tags, `${this.tags().get(u.dispenserId) ?? ''}${u.purpose === 'status' ? ' (status)' : ''}`]);
    }
    return [...byReason].map(([reason, tags]) => ({ reason, tags }));
  });
}
