import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { DEMAND_UNITS, demandFigure, type DemandUnit, type DemandWay, type Grease, type Point, type StatedPer, withUnit } from '#calc';
import { Segmented } from '../../shared/controls/segmented';
import type { Choice } from '../../shared/fields/choice';
import { SaveField } from '../../shared/fields/save-field';
import { SaveSelect } from '../../shared/fields/save-select';
import { numberText, positive, type Read, refused, type Typed, volumeText, volumeUl } from '../../shared/fields/typed';
import { Figure } from '../../shared/figure/figure';
import { FindingMark } from '../../shared/findings/finding-mark';
import { FACTOR_STEPS, stepsWith } from '../factor-steps';
import type { PointRow } from '../point-rows';

type NumberField = 'boreMm' | 'outsideMm' | 'widthMm' | 'speedRpm' | 'practiceStrokes' | 'practiceGramsPerStroke' | 'practiceEveryDays' | 'hoursPerDay';

interface NumberInput {
  readonly field: NumberField;
  readonly label: string;
  readonly unit: string;
  readonly read: Read<number | null>;
}

const number = (field: NumberField, label: string, unit: string, max: number): NumberInput =>
  ({ field, label, unit, read: (text) => positive(text, max, unit) });

const STATED_PER: readonly Choice<StatedPer>[] = [
  { value: '1000h', label: 'per 1,000 h' }, { value: '100h', label: 'per 100 h' }, { value: 'running-day', label: 'per running day' },
  { value: 'week', label: 'per week' }, { value: 'month', label: 'per month' },
];

/** How a point's demand is known, with the inputs of that way; each field saves by itself. */
@Component({
  selector: 'lw-demand-form',
  imports: [Figure, FindingMark, SaveField, SaveSelect, Segmented],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: '../side-panel/panel-form.css',
  templateUrl: './demand-form.html',
})
export class DemandForm {
  readonly row = input.required<PointRow>();
  readonly greases = input.required<readonly Grease[]>();
  readonly unit = input.required<DemandUnit>();
  readonly editable = input.required<boolean>();
  readonly edited = output<Partial<Point>>();

  protected readonly ways: readonly { readonly value: DemandWay; readonly label: string }[] = [
    { value: 'bearing', label: 'Bearing' }, { value: 'stated', label: 'Stated' }, { value: 'practice', label: 'Practice' },
  ];
  protected readonly bearing = [
    number('boreMm', 'Bore d', 'mm', 5000), number('outsideMm', 'Outside diameter D', 'mm', 8000),
    number('widthMm', 'Width B', 'mm', 2000), number('speedRpm', 'Speed', 'rpm', 200_000),
  ];
  protected readonly practice = [
    number('practiceStrokes', 'Strokes', 'each time', 10_000), number('practiceGramsPerStroke', 'Grams a stroke', 'g', 1000), number('practiceEveryDays', 'Every', 'd', 3650),
  ];
  protected readonly hours = number('hoursPerDay', 'Hours a running day', 'h', 24);
  protected readonly statedPer = STATED_PER;
  protected readonly factors = FACTOR_STEPS;
  protected readonly stepsWith = stepsWith;
  protected readonly text = numberText;
  protected readonly volumeText = volumeText;
  protected readonly readVolume: Read<number | null> = (text) => volumeUl(text, 1e10);

  protected readonly point = computed(() => this.row().point);
  protected readonly needsGrease = computed(() => this.point().demandWay !== 'stated');
  protected readonly greaseChoices = computed(() =>
    this.greases().map((grease): Choice<string> => ({ value: grease.id, label: `${grease.name}, NLGI ${grease.nlgi}, ${grease.densityGPerCm3} g/cm³` })));
  protected readonly demand = computed(() => {
    const { demandUlPer1000h, point } = this.row();
    return withUnit(demandFigure(demandUlPer1000h, this.unit(), point.hoursPerDay, point.daysPerWeek), DEMAND_UNITS[this.unit()]);
  });

  protected setWay(way: string): void {
    if (way !== this.point().demandWay) this.edited.emit({ demandWay: way as DemandWay });
  }

  protected setNumber(field: NumberField, value: number | null): void {
    this.edited.emit({ [field]: value });
  }

  protected setFactor(name: string, value: number): void {
    this.edited.emit({ factors: { ...this.point().factors, [name]: value } });
  }

  /** Days of a week cannot be left undecided. */
  protected readonly readDays: Read<number> = (text) => {
    const typed = positive(text, 7, 'd');
    return typed.ok && typed.value === null ? refused('Enter the days of a week on which it runs.') : (typed as Typed<number>);
  };
}
