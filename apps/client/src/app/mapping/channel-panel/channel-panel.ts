import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ampsAgainstMaximum, type Assessment, type Design, voltsAgainstMinimum } from '#calc';
import type { CabinetModules } from '../board';
import type { ChannelRow } from '../mapping-rows';

/** What the channel under the keyboard carries, and how many channels of its kind the cabinet keeps free. */
@Component({
  selector: 'lw-channel-panel',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './channel-panel.html',
  styleUrl: './channel-panel.css',
})
export class ChannelPanel {
  readonly row = input.required<ChannelRow | null>();
  readonly cabinets = input.required<readonly CabinetModules[]>();
  readonly design = input.required<Design>();
  readonly assessment = input.required<Assessment>();
  readonly editable = input.required<boolean>();

  protected readonly upTo = ampsAgainstMaximum;
  protected readonly volts = voltsAgainstMinimum;
  protected readonly lane = computed(() => {
    const id = this.row()?.occupant?.dispenser.id;
    return (id && this.assessment().lanes.get(id)) || null;
  });
  protected readonly type = computed(() => this.design().moduleTypes.find((t) => t.id === this.row()?.module.typeId) ?? null);
  protected readonly group = computed(() => {
    const row = this.row();
    const type = this.type();
    return row && type ? (this.assessment().groups.get(`${row.module.id}/${Math.floor(row.channel / type.channelsPerGroup)}`) ?? null) : null;
  });
  protected readonly spare = computed(() => {
    const row = this.row();
    const type = this.type();
    const cabinet = this.cabinets().find((c) => c.modules.some((m) => m.module.id === row?.module.id));
    if (!cabinet || !type) return null;
    const modules = cabinet.modules.filter((m) => m.type.kind === type.kind);
    const channels = modules.reduce((sum, m) => sum + m.type.channels, 0);
    const ids = new Set(modules.map((m) => m.module.id));
    const used = this.design().assignments.filter((a) => ids.has(a.moduleId)).length;
    const percent = this.design().project.sparePercent;
    return { location: cabinet.cabinet.location, kind: type.kind, channels, used, keeps: Math.ceil((channels * percent) / 100), percent };
  });
}
