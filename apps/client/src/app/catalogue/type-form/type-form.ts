import { ChangeDetectionStrategy, Component, computed, ElementRef, inject, input, type OnInit, output, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatFormField, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { Problem } from '#contract';
import { v7 as newId } from 'uuid';
import { Icon } from '../../shared/icon/icon';
import { Notice } from '../../shared/states/notice';
import type { Entry, Field, KindView } from '../fields/field';
import { formErrors, nameError } from '../fields/field-errors';
import { bodyOf, type FieldValue, formValueOf, isAsked } from '../fields/field-values';
import { serverErrors } from '../fields/server-errors';

/** Makes a new type, or the next version of one; its fields are those of the kind. */
@Component({
  selector: 'lw-type-form',
  imports: [Icon, MatButton, MatFormField, MatIconButton, MatInput, MatSuffix, Notice, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './type-form.html',
  styleUrl: './type-form.css',
})
export class TypeForm implements OnInit {
  readonly view = input.required<KindView>();
  /** The version that the next one starts from; null: a new type. */
  readonly from = input<Entry | null>(null);
  /** Names that exist. */
  readonly names = input.required<ReadonlySet<string>>();
  readonly saving = input(false);
  readonly refused = input<Problem | null>(null);
  readonly saved = output<Readonly<Record<string, unknown>>>();
  readonly closed = output();

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly form = this.builder.record<FieldValue>({});
  private readonly values = signal<Record<string, FieldValue>>({});
  private readonly left = signal<ReadonlySet<string>>(new Set());
  private readonly tried = signal(false);
  /** One id for all tries: a repeated request then makes no second version. */
  private readonly id = newId();

  protected readonly groups = computed(() => this.view().groups
    .map(({ title, fields }) => ({ title, fields: fields.filter((field) => isAsked(this.view(), field, this.values())) }))
    .filter((group) => group.fields.length > 0));
  private readonly errors = computed(() => {
    const errors = new Map(formErrors(this.view(), this.values()));
    const name = this.from() ? null : nameError(String(this.values()['name'] ?? ''), this.names(), this.view().versioned);
    if (name) errors.set('name', name);
    return errors;
  });
  private readonly fromServer = computed(() => serverErrors(this.view(), this.refused()));
  /** Words at each field: ours once it was left or sending was tried, else the server's. */
  protected readonly said = computed(() => {
    const own = [...this.errors()].filter(([key]) => this.tried() || this.left().has(key));
    return new Map([...this.fromServer().fields, ...own]);
  });
  protected readonly refusal = computed(() => this.fromServer().rest);
  protected readonly wrong = computed(() => (this.tried() ? this.errors().size : 0));

  /** Something was typed that is not sent. */
  get isDirty(): boolean {
    return this.form.dirty;
  }

  ngOnInit(): void {
    const start = formValueOf(this.view(), this.from());
    for (const [key, value] of Object.entries(start)) this.form.addControl(key, this.builder.control(value));
    this.values.set(this.form.getRawValue());
    this.form.valueChanges.subscribe(() => this.values.set(this.form.getRawValue()));
  }

  protected leave(key: string): void {
    this.left.update((left) => new Set([...left, key]));
  }

  protected has(field: Field, value: string): boolean {
    const chosen = this.values()[field.key];
    return Array.isArray(chosen) && chosen.includes(value);
  }

  /** Ticks or unticks one of several; the order stays that of the choices. */
  protected toggle(field: Field, value: string): void {
    if (field.kind !== 'choices') return;
    const next = field.choices.map((choice) => choice.value).filter((one) => this.has(field, one) !== (one === value));
    this.form.controls[field.key]?.setValue(next);
    this.form.markAsDirty();
  }

  protected save(): void {
    this.tried.set(true);
    const [first] = this.errors().keys();
    if (first !== undefined) {
      this.host.nativeElement.querySelector<HTMLElement>(`[data-field="${this.errors().has('name') ? 'name' : first}"]`)?.focus();
      return;
    }
    this.saved.emit(bodyOf(this.view(), this.form.getRawValue(), this.id));
  }
}
