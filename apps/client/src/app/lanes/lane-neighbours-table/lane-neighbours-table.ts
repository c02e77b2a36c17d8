import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { LaneLine } from '../../shared/lane/lane-line';
import { StateGlyph } from '../../shared/lane/state-glyph';
import type { Neighbours } from '../lane-neighbours';

/** The lanes that begin at the same box, one under the other: who runs with this one in its worst set, and who is short of volts. */
@Component({
  selector: 'lw-lane-neighbours-table',
  imports: [LaneLine, RouterLink, StateGlyph],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './lane-neighbours-table.css',
  templateUrl: './lane-neighbours-table.html',
})
export class LaneNeighboursTable {
  readonly neighbours = input.required<Neighbours>();
  readonly shown = input.required<string>();
  readonly projectId = input.required<string>();
}
