import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import type { Cabinet, CableNode, Circuit, Controller, Design, Module, Supply } from '#calc';
import type { EditableCollection } from '#contract';
import { firstValueFrom } from 'rxjs';
import { ProjectStore } from '../core/project/project-store';
import { AddRow } from './add-row/add-row';
import type { NewRow } from './add-row/new-row';
import { ConfirmDelete, type Deletion } from './confirm-delete/confirm-delete';
import { newBox, newCabinet, newCircuit, newController, newModule, newSupply } from './new-rows';

/** Makes and deletes rows of hardware: asks first, then leaves it to the project store. */
@Injectable()
export class HardwareActs {
  private readonly project = inject(ProjectStore);
  private readonly dialog = inject(MatDialog);

  addCabinet(): void {
    this.add((design) => newCabinet(design));
  }

  addController(cabinet: Cabinet): void {
    this.add((design) => newController(design, cabinet));
  }

  addModule(controller: Controller): void {
    this.add((design) => newModule(design, controller));
  }

  addSupply(): void {
    this.add((design) => newSupply(design));
  }

  addCircuit(supply: Supply): void {
    this.add((design) => newCircuit(design, supply));
  }

  /** A box behind another, or at the cabinet's terminals. */
  addBox(circuit: Circuit, parent: CableNode | null): void {
    this.add((design) => newBox(design, circuit, parent));
  }

  deleteCabinet(cabinet: Cabinet): void {
    this.delete('cabinets', cabinet.id, cabinet.location, 'The cabinet goes with its description and temperature.', (d) => [
      held(d.controllers.filter((c) => c.cabinetId === cabinet.id), 'controller', 'Controllers: delete them under Cabinets and modules.'),
      held(d.supplies.filter((s) => s.cabinetId === cabinet.id), 'supply', 'Supplies: delete them under Supplies and circuits.', 'supplies'),
    ]);
  }

  deleteController(controller: Controller): void {
    this.delete('controllers', controller.id, controller.name, 'The controller goes.', (d) => [
      held(d.modules.filter((m) => m.controllerId === controller.id), 'module', 'Modules: delete them under Cabinets and modules.'),
      held(d.dispensers.filter((x) => x.controllerId === controller.id), 'dispenser', dispensersTo('another controller')),
    ]);
  }

  deleteModule(module: Module): void {
    this.delete('modules', module.id, module.name, 'The module goes, and its groups with the circuits that feed them.', (d) => [
      held(d.assignments.filter((a) => a.moduleId === module.id), 'mapped channel', 'Mapped channels: unmap them under I/O mapping.'),
    ]);
  }

  deleteSupply(supply: Supply): void {
    this.delete('supplies', supply.id, supply.name, 'The supply goes with its settings.', (d) => [
      held(d.circuits.filter((c) => c.supplyId === supply.id), 'circuit', 'Circuits: delete them under Supplies and circuits.'),
    ]);
  }

  deleteCircuit(circuit: Circuit): void {
    this.delete('circuits', circuit.id, circuit.name, 'The circuit goes with its protection and its limit k.', (d) => [
      held(d.cableNodes.filter((n) => n.circuitId === circuit.id), 'box', 'Boxes: delete them under Cable tree, the last of a trunk first.', 'boxes'),
      held(d.dispensers.filter((x) => x.circuitId === circuit.id), 'dispenser', dispensersTo('another circuit')),
      held(d.moduleGroups.filter((g) => g.circuitId === circuit.id), 'output group', 'Output groups: choose another circuit that feeds them under Cabinets and modules.'),
    ]);
  }

  deleteBox(node: CableNode): void {
    this.delete('cableNodes', node.id, node.location, `The box goes with its trunk cable ${node.cableTag}.`, (d) => [
      held(d.cableNodes.filter((n) => n.parentId === node.id), 'box', 'Boxes: delete those behind it first, the last of the trunk before the others.', 'boxes'),
      held(d.dispensers.filter((x) => x.nodeId === node.id), 'dispenser', dispensersTo('another junction box')),
    ]);
  }

  private add(rowOf: (design: Design) => NewRow): void {
    const design = this.project.design();
    if (design) void this.askAndAdd(rowOf(design));
  }

  private async askAndAdd(row: NewRow): Promise<void> {
    const dialog = this.dialog.open<AddRow, NewRow, Record<string, unknown>>(AddRow, { data: row, width: '440px' });
    const values = await firstValueFrom(dialog.afterClosed());
    if (values) await this.project.create(row.collection, values, `${String(values['name'] ?? values['location'])} added`);
  }

  private delete(collection: EditableCollection, id: string, name: string, goes: string, holds: (design: Design) => readonly Held[]): void {
    const design = this.project.design();
    if (!design) return;
    const still = holds(design).filter(({ rows }) => rows > 0);
    void this.askAndDelete(collection, id, { name, goes, held: still.map(({ words }) => words).join(', '), how: still.map(({ how }) => how) });
  }

  private async askAndDelete(collection: EditableCollection, id: string, deletion: Deletion): Promise<void> {
    const dialog = this.dialog.open<ConfirmDelete, Deletion, boolean>(ConfirmDelete, { data: deletion, width: '440px' });
    if (await firstValueFrom(dialog.afterClosed())) await this.project.remove(collection, id, `${deletion.name} deleted`);
  }
}

/** Rows that stand on the one to be deleted, and what is to be done with them first. */
interface Held {
  readonly rows: number;
  /** `2 controllers` */
  readonly words: string;
  readonly how: string;
}

const held = ({ length }: readonly unknown[], one: string, how: string, many = `${one}s`): Held =>
  ({ rows: length, words: `${length} ${length === 1 ? one : many}`, how });

const dispensersTo = (place: string): string => `Dispensers: choose ${place} under Points and doses, beside the table, or delete their points.`;
