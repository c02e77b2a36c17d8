import type { Severity } from '#calc';
import { group, type Mark, text, title } from '../drawing/mark';
import { findingMark } from './finding-mark-shapes';
import { CABINET } from './loop-cabinet-shapes';
import type { Layout } from './loop-geometry';
import type { LoopFinding, LoopPlace, LoopView } from './loop-view';

const ORDER: readonly Severity[] = ['error', 'warning', 'note'];

/** At each part the gravest of its findings, how many there are, and its code; the pointer reads them all. */
export function findingShapes(loop: LoopView, layout: Layout): readonly Mark[] {
  const spots = spotsOf(loop, layout);
  return (Object.keys(spots) as LoopPlace[]).flatMap((place) => {
    const here = loop.findings.filter((f) => f.place === place);
    return here.length === 0 ? [] : [markOf(here, spots[place])];
  });
}

interface Spot {
  readonly x: number;
  readonly y: number;
  /** Where its code stands; left out: there is no room for it. */
  readonly code?: 'right' | 'below';
}

function markOf(here: readonly LoopFinding[], { x, y, code }: Spot): Mark {
  const gravest = [...here].sort((a, b) => ORDER.indexOf(a.severity) - ORDER.indexOf(b.severity))[0];
  const more = here.length > 1 ? ` +${here.length - 1}` : '';
  const cls = `mono ${gravest.severity === 'note' ? 'dim' : 'c-err'}`;
  return group('spot', title(here.map((f) => `${f.code}: ${f.title}`).join('\n')), findingMark(x, y, gravest.severity),
    ...(code === 'right' ? [text(cls, x + 9, y + 4, gravest.code + more)] : code === 'below' ? [text(cls, x, y + 18, gravest.code + more, 'middle')] : []));
}

function spotsOf(loop: LoopView, { conductors, boxes, dispenser, point, trunk, half }: Layout): Readonly<Record<LoopPlace, Spot>> {
  const fourCore = loop.wiring === 'four-core';
  const between = (conductors[0].y + conductors[1].y) / 2;
  const box = boxes.at(-1);
  return {
    supply: { x: CABINET.supplyRight, y: 90.5 },
    protection: { x: CABINET.protectionRight, y: 114.5 },
    output: { x: fourCore ? 144 : 174, y: (fourCore ? 168.5 : conductors[0].y) - 10 },
    status: { x: 144, y: conductors.at(-1)!.y - 10 },
    trunk: { x: ((box ?? trunk) + trunk) / 2 - half - 20, y: between, code: 'right' },
    cable: { x: ((box ?? trunk) + half + dispenser) / 2 - 18, y: between, code: 'right' },
    dispenser: { x: dispenser + 116, y: 90.5 },
    point: { x: point + 43, y: 126 },
  };
}
