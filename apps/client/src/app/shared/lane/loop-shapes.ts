import { group, type Mark, path, text } from '../drawing/mark';
import { glyphShapes } from './glyph-shapes';
import { LANE_STATE_WORDS, type LaneState } from './lane-view';
import { cabinetShapes } from './loop-cabinet-shapes';
import { deviceShapes } from './loop-device-shapes';
import { fieldShapes } from './loop-field-shapes';
import { findingShapes } from './loop-finding-shapes';
import { layoutOf, WIDTH, type Zone } from './loop-geometry';
import type { LoopView } from './loop-view';
import { profileShapes } from './profile-shapes';

/** The wide loop diagram with the voltage profile under it, in a width in px. */
export function loopShapes(loop: LoopView, width = WIDTH): readonly Mark[] {
  const layout = layoutOf(loop, width);
  return [
    ...layout.zones.flatMap((zone) => zoneHead(zone, loop.state, layout.profileTop)),
    group('cabinet', ...cabinetShapes(loop, layout)), group('field', ...fieldShapes(loop, layout)), group('device', ...deviceShapes(loop, layout)),
    group('profile', ...profileShapes(loop, layout)), group('found', ...findingShapes(loop, layout)),
  ];
}

function zoneHead(zone: Zone, state: LaneState, foot: number): readonly Mark[] {
  const x = zone.x + 12;
  return [
    ...(zone.x > 0 ? [path('zone-rule', `M${zone.x + 0.5} 0V${foot - 14}`)] : []),
    text('z', x, 20, zone.title), text('mono dim', x, 36, zone.designation),
    group('zone-state', ...glyphShapes(state, x, 43)), group(`st-${state}`, text('state', x + 33, 53, LANE_STATE_WORDS[state])),
  ];
}
