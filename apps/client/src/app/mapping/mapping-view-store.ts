import { computed, inject, Injectable, signal } from '@angular/core';
import { autoAssign, type Dispenser, type Point, type Purpose } from '#calc';
import { ProjectStore } from '../core/project/project-store';
import { type Mend, mendOf } from '../shared/findings/finding-mend';
import type { LaneView } from '../shared/lane/lane-view';
import { laneViewsOf } from '../shared/lane/lane-views';
import { assignChange, fillFrom, missingPurposes, proposalChanges, unassignChanges } from './mapping-changes';
import { type ChannelRow, mappingSections, modulesByCabinet, type Proposal } from './mapping-rows';

/** A dispenser that lacks a signal. */
export interface OpenLane {
  readonly dispenser: Dispenser;
  readonly point: Point;
  readonly missing: readonly Purpose[];
  readonly circuit: string | null;
  readonly controller: string | null;
  readonly loadA: number | null;
  readonly runLengthM: number | null;
}

export type Shown = 'output' | 'input' | 'both';

/** What the mapping screen shows and selects; the rows themselves belong to the project store. */
@Injectable()
export class MappingViewStore {
  private readonly project = inject(ProjectStore);
  readonly shown = signal<Shown>('output');
  readonly filter = signal('');
  readonly selected = signal<ReadonlySet<string>>(new Set());
  readonly focusedKey = signal<string | null>(null);
  readonly markedKeys = signal<ReadonlySet<string>>(new Set());
  readonly preview = signal<ReturnType<typeof autoAssign> | null>(null);

  readonly canEdit = this.project.canEdit;
  readonly cabinets = computed(() => {
    const design = this.project.design();
    return design ? modulesByCabinet(design) : [];
  });
  readonly sections = computed(() => {
    const design = this.project.design();
    const assessment = this.project.assessment();
    return design && assessment ? mappingSections(design, assessment, this.shown(), this.preview()?.proposed ?? []) : [];
  });
  /** The drawing of each lane, by dispenser id. */
  readonly lanes = computed<ReadonlyMap<string, LaneView>>(() => {
    const design = this.project.design();
    const assessment = this.project.assessment();
    return design && assessment ? laneViewsOf(design, assessment) : new Map<string, LaneView>();
  });
  /** One-click mends of the findings shown, for those who may edit. */
  readonly mends = computed<ReadonlyMap<string, Mend>>(() => {
    const design = this.project.design();
    const assessment = this.project.assessment();
    if (!design || !assessment || !this.canEdit()) return new Map<string, Mend>();
    return new Map(assessment.findings.flatMap((finding) => {
      const mend = mendOf(finding, design, assessment);
      return mend ? [[finding.key, mend] as const] : [];
    }));
  });
  readonly open = computed<readonly OpenLane[]>(() => {
    const design = this.project.design();
    const assessment = this.project.assessment();
    if (!design || !assessment) return [];
    const points = new Map(design.points.map((p) => [p.id, p]));
    const circuits = new Map(design.circuits.map((c) => [c.id, c.name]));
    const controllers = new Map(design.controllers.map((c) => [c.id, c.name]));
    return design.dispensers.flatMap((dispenser) => {
      const point = points.get(dispenser.pointId);
      const missing = missingPurposes(design, dispenser);
      const lane = assessment.lanes.get(dispenser.id);
      if (!point || missing.length === 0) return [];
      return [{
        dispenser, point, missing,
        circuit: circuits.get(dispenser.circuitId ?? '') ?? null, controller: controllers.get(dispenser.controllerId ?? '') ?? null,
        loadA: lane?.channelA ?? null, runLengthM: lane?.runLengthM ?? null,
      }];
    }).sort((a, b) => a.point.tag.localeCompare(b.point.tag, 'en', { numeric: true }));
  });
  readonly visibleOpen = computed(() => {
    const words = this.filter().toLowerCase().split(/\s+/).filter(Boolean);
    return this.open().filter((lane) => {
      const text = [lane.point.tag, lane.point.description, lane.point.machine, lane.circuit, lane.controller].join(' ').toLowerCase();
      return words.every((word) => text.includes(word));
    });
  });
  readonly selectedOpen = computed(() => this.open().filter((lane) => this.selected().has(lane.dispenser.id)));
  readonly counts = computed(() => {
    const design = this.project.design();
    const mapped = new Set(design?.assignments.filter((a) => a.purpose === 'control').map((a) => a.dispenserId));
    const pulsed = design?.dispensers.filter((d) => d.method === 'pulse') ?? [];
    return {
      mapped: pulsed.filter((d) => mapped.has(d.id)).length, dispensers: pulsed.length,
      modules: design?.modules.length ?? 0, cabinets: design?.cabinets.length ?? 0,
    };
  });
  readonly channels = computed(() => this.sections().flatMap((section) => section.channels));
  readonly focused = computed(() => this.channels().find((row) => row.key === this.focusedKey()) ?? null);

  toggle(dispenserId: string): void {
    this.selected.update((set) => toggled(set, dispenserId));
  }

  selectAll(on: boolean): void {
    this.selected.set(new Set(on ? this.visibleOpen().map((lane) => lane.dispenser.id) : []));
  }

  mark(key: string): void {
    this.markedKeys.update((set) => toggled(set, key));
  }

  async assign(lane: OpenLane, row: ChannelRow): Promise<void> {
    const design = this.project.design();
    if (!design) return;
    await this.project.apply(`${lane.point.tag} on ${row.address}`, assignChange(design, lane.dispenser.id, row));
    this.selected.update((set) => new Set([...set].filter((id) => id !== lane.dispenser.id)));
  }

  /** The selected dispensers on the free channels from this row on. */
  async assignSelected(row: ChannelRow): Promise<void> {
    const wanting = this.selectedOpen().filter((lane) => lane.missing.includes(row.purpose));
    await this.place(fillFrom(this.sections(), row, wanting.map((lane) => lane.dispenser.id)), `from ${row.address} on`);
  }

  async unassign(keys: ReadonlySet<string>): Promise<void> {
    const design = this.project.design();
    const changes = design ? unassignChanges(design, keys) : [];
    if (changes.length === 0) return;
    await this.project.apply(`${changes.length === 1 ? 'A channel' : `${changes.length} channels`} unmapped`, changes);
    this.markedKeys.set(new Set());
  }

  previewAutoAssign(): void {
    const design = this.project.design();
    if (!design) return;
    const ids = this.selectedOpen().map((lane) => lane.dispenser.id);
    this.preview.set(autoAssign(design, ids.length > 0 ? ids : undefined));
    this.shown.set('both');
  }

  async acceptPreview(): Promise<void> {
    const proposed = this.preview()?.proposed ?? [];
    this.preview.set(null);
    await this.place(proposed, 'by auto-assignment');
    this.selected.set(new Set());
  }

  discardPreview(): void {
    this.preview.set(null);
  }

  private async place(proposals: readonly Proposal[], how: string): Promise<void> {
    if (proposals.length === 0) return;
    await this.project.apply(`${proposals.length === 1 ? 'One channel' : `${proposals.length} channels`} mapped ${how}`, proposalChanges(proposals));
  }
}

const toggled = (set: ReadonlySet<string>, value: string): ReadonlySet<string> => {
  const next = new Set(set);
  if (!next.delete(value)) next.add(value);
  return next;
};
