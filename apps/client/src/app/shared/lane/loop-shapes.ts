import { group, type Mark, path, text } from '../drawing/mark';
import { cabinetShapes } from './loop-cabinet-shapes';
import { fieldShapes } from './loop-field-shapes';
import { conductorsOf, PROFILE, zonesOf } from './loop-geometry';
import type { LoopView } from './loop-view';
import { profileShapes } from './profile-shapes';

/** The wide loop diagram with the voltage profile under it. */
export function loopShapes(loop: LoopView): readonly Mark[] {
  const conductors = conductorsOf(loop);
  return [
    ...zonesOf(loop).flatMap((zone) => [
      ...(zone.x > 0 ? [path('zone-rule', `M${zone.x} 0V${PROFILE.top - 12}`)] : []),
      text('z', zone.x + 12, 20, zone.title), text('mono dim', zone.x + 12, 36, zone.designation),
    ]),
    group('cabinet', ...cabinetShapes(loop, conductors)), group('field', ...fieldShapes(loop, conductors)), group('profile', ...profileShapes(loop)),
  ];
}
