import type { ElementRef } from '@angular/core';
import { afterNextRender, ChangeDetectionStrategy, Component, computed, input, output, signal, viewChild } from '@angular/core';
import { MatAutocomplete, MatAutocompleteTrigger, MatOption } from '@angular/material/autocomplete';
import { formatMetres } from '#calc';
import type { ChannelRow } from '../mapping-rows';
import { lacking, type OpenLane } from '../open-lanes';

/** Type-ahead in a free channel: part of a tag or description, Enter assigns, Escape leaves. */
@Component({
  selector: 'lw-channel-finder',
  imports: [MatAutocomplete, MatAutocompleteTrigger, MatOption],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './channel-finder.html',
  styleUrl: './channel-finder.css',
})
export class ChannelFinder {
  readonly row = input.required<ChannelRow>();
  readonly lanes = input.required<readonly OpenLane[]>();
  readonly first = input('');
  readonly chosen = output<OpenLane>();
  readonly left = output<void>();

  protected readonly metres = formatMetres;
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');
  private readonly typed = signal<string | null>(null);
  protected readonly text = computed(() => this.typed() ?? this.first());
  protected readonly options = computed(() => {
    const words = this.text().toLowerCase().split(/\s+/).filter(Boolean);
    return this.lanes()
      .filter((lane) => lacking(lane, this.row().purpose))
      .filter((lane) => words.every((w) => `${lane.point.tag} ${lane.point.description ?? ''} ${lane.point.machine ?? ''}`.toLowerCase().includes(w)))
      .slice(0, 50);
  });

  constructor() {
    afterNextRender(() => {
      const field = this.field().nativeElement;
      field.focus();
      field.setSelectionRange(field.value.length, field.value.length);
    });
  }

  protected search(text: string): void {
    this.typed.set(text);
  }

  protected choose(dispenserId: string): void {
    const lane = this.lanes().find((l) => l.dispenser.id === dispenserId);
    if (lane) this.chosen.emit(lane);
  }
}
