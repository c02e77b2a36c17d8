import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type ConductorClass, type Design, type DischargeMethod, type Dispenser, formatSection, NOTHING, type Point, STANDARD_SECTIONS_MM2, type Zone } from '#calc';
import type { Choice } from '../../shared/fields/choice';
import { SaveField } from '../../shared/fields/save-field';
import { SaveSelect } from '../../shared/fields/save-select';
import { typeChoices } from '../../shared/fields/type-choices';
import { numberText, positive, type Read, words } from '../../shared/fields/typed';
import type { PointRow } from '../point-rows';

type PointText = 'machine' | 'function' | 'location' | 'product';

const ZONES: readonly Choice<Zone>[] = [
  { value: 'none', label: 'not classified' },
  ...(['0', '1', '2'] as const).map((value) => ({ value, label: `zone ${value}, gas` })),
  ...(['20', '21', '22'] as const).map((value) => ({ value, label: `zone ${value}, dust` })),
];

/** The dispenser at a point: type, discharge, where it belongs, its own cable, and the place it stands in. */
@Component({
  selector: 'lw-dispenser-form',
  imports: [MatButton, SaveField, SaveSelect],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: '../side-panel/panel-form.css',
  templateUrl: './dispenser-form.html',
})
export class DispenserForm {
  readonly row = input.required<PointRow>();
  readonly design = input.required<Design>();
  readonly editable = input.required<boolean>();
  readonly edited = output<Partial<Dispenser>>();
  readonly pointEdited = output<Partial<Point>>();
  readonly asked = output<void>();

  protected readonly zones = ZONES;
  protected readonly classes: readonly Choice<ConductorClass>[] = [{ value: 5, label: '5, flexible' }, { value: 2, label: '2, stranded' }];
  protected readonly sections = STANDARD_SECTIONS_MM2.map((mm2): Choice<number> => ({ value: mm2, label: formatSection(mm2) }));
  protected readonly names: readonly { readonly field: PointText; readonly label: string }[] = [
    { field: 'machine', label: 'Machine' }, { field: 'function', label: 'Function designation' },
    { field: 'location', label: 'Location designation' }, { field: 'product', label: 'Product designation' },
  ];
  protected readonly nothing = NOTHING;
  protected readonly text = numberText;
  protected readonly readMetres: Read<number | null> = (text) => positive(text, 10_000, 'm');
  protected readonly readText: Read<string | null> = (text) => words(text, 200);
  protected readonly readRemarks: Read<string | null> = (text) => words(text, 4000);

  protected readonly types = computed(() => typeChoices(this.design().dispenserTypes, this.row().dispenser?.typeId));
  protected readonly methods = computed((): readonly Choice<DischargeMethod>[] =>
    [{ value: 'pulse', label: 'by pulse' }, ...(this.row().type?.timedMonths.length || this.row().dispenser?.method === 'timed' ? [{ value: 'timed' as const, label: 'timed, on its own clock' }] : [])]);
  protected readonly periods = computed(() => (this.row().type?.timedMonths ?? []).map((months): Choice<number> => ({ value: months, label: `${months} ${months === 1 ? 'month' : 'months'}` })));
  protected readonly controllers = computed(() => {
    const cabinets = new Map(this.design().cabinets.map((cabinet) => [cabinet.id, cabinet.location]));
    return this.design().controllers.map((each): Choice<string> => ({ value: each.id, label: [each.name, cabinets.get(each.cabinetId)].filter(Boolean).join(', ') }));
  });
  protected readonly circuits = computed(() => this.design().circuits.map((circuit): Choice<string> => ({ value: circuit.id, label: circuit.name })));
  protected readonly boxes = computed(() =>
    this.design().cableNodes.filter((node) => node.circuitId === this.row().dispenser?.circuitId).map((node): Choice<string> => ({ value: node.id, label: node.location })));
  /** A section that is not a usual one is still shown. */
  protected readonly ownSections = computed(() => {
    const own = this.row().dispenser?.crossSectionMm2;
    return own == null || this.sections.some((each) => each.value === own) ? this.sections : [...this.sections, { value: own, label: formatSection(own) }];
  });

  protected setName(field: PointText, value: string | null): void {
    this.pointEdited.emit({ [field]: value });
  }

  /** The wiring follows the type. */
  protected setType(typeId: string | null): void {
    const type = this.design().dispenserTypes.find((each) => each.id === typeId);
    this.edited.emit({ typeId, wiring: type?.wiring ?? this.row().dispenser?.wiring ?? null });
  }

  /** A box belongs to its circuit, so another circuit leaves it. */
  protected setCircuit(circuitId: string | null): void {
    this.edited.emit({ circuitId, nodeId: null });
  }
}
