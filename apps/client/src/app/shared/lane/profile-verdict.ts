import { formatNumber } from '#calc';
import { circle, type Mark, path, rect, round, text, unit, type Words } from '../drawing/mark';
import type { Layout } from './loop-geometry';
import { isLow, type LoopProfile } from './loop-view';
import { wrapped } from './wrapped';

/** The lowest voltage while it idles, at the end of the profile and in its legend. */
export const idleMark = (x: number, y: number): Mark => rect('v-idle', x - 3.5, y - 3.5, 7, 7);
/** The lowest voltage with every dispenser of the circuit on. */
export const allOnMark = (x: number, y: number): Mark => path('v-all', `M${round(x)} ${round(y - 4.5)}l4.5 4.5l-4.5 4.5l-4.5 -4.5z`);

/** Left of the chart: what each line and mark means. */
export function legend(profile: LoopProfile, { profileTop }: Layout): readonly Mark[] {
  const y = profileTop + 16;
  const rows: readonly (readonly [Mark, string])[] = [
    profile.collapsed ? [path('v-fall', 'M12 0h26'), 'worst set: none left'] : [path('v-now', 'M12 0h26'), 'worst permitted set'],
    [path('v-alone', 'M12 0h26'), 'running alone'],
    ...(profile.idleV === null ? [] : [[idleMark(25, 0), 'idle, worst set'] as const]),
    ...(profile.allOnV === null ? [] : [[allOnMark(25, 0), 'all on'] as const]),
    ...(profile.minV === null ? [] : [[path('v-min', 'M12 0h26'), 'lowest permitted'] as const]),
  ];
  return [text('z', 12, y, 'Voltage along the lane'), ...rows.flatMap(([mark, words], i) => {
    const at = y + 20 + i * 17;
    return [{ tag: 'g', attrs: { transform: `translate(0 ${at})` }, children: [mark] } as const, text('dim', 46, at + 4, words)];
  })];
}

/** Right of the chart: the figure that counts and how it comes about, then the others, each behind its mark. */
export function verdict(profile: LoopProfile, { dispenser, profileTop: top }: Layout): readonly Mark[] {
  const x = dispenser + 22;
  const aloneV = profile.stations.at(-1)?.aloneV ?? null;
  const lowest = profile.lowestV === null ? [] : [`lowest supply ${formatNumber(profile.lowestV, 1, 'down')} V, cable at ${profile.tempC} °C`];
  const why = wrapped(profile.worstSet, 38);
  const others = [
    ...(profile.idleV === null ? [] : [(y: number) => line(x, y, [...volts(profile.idleV), ' idle, the worst set running'], idleMark(x + 7, y - 4))]),
    ...(profile.allOnV === null ? [] : [(y: number) => line(x, y, [...volts(profile.allOnV), ` with all ${profile.allOnCount} on: only software keeps k`], allOnMark(x + 7, y - 4))]),
    (y: number) => margin(profile, x, y),
  ];
  return [
    ...line(x, top + 14, aloneV === null ? ['no voltage running alone either'] : [...volts(aloneV, 'nearest'), ' running alone, supply as set'], path('v-alone', `M${x} ${top + 10}h14`)),
    ...lead(profile, x, top + 48), ...[...why, ...lowest].map((words, i) => text(i < why.length ? '' : 'dim', x + 92, top + 36 + i * 15, words)),
    ...others.flatMap((drawn, i) => drawn(top + 92 + i * 18)),
  ];
}

const line = (x: number, y: number, words: readonly (string | Words)[], mark: Mark): readonly Mark[] => [mark, text('', x + 22, y, words)];

const volts = (value: number | null, rounding: 'down' | 'nearest' = 'down'): readonly (string | Words)[] =>
  [{ cls: 'strong', text: formatNumber(value, 1, rounding) }, unit('V')];

function lead(profile: LoopProfile, x: number, y: number): readonly Mark[] {
  const worst = profile.stations.at(-1)?.worstV ?? null;
  if (profile.collapsed || worst === null) return [path('v-cross', `M${x + 2} ${y - 11}l10 10m0 -10l-10 10`), text('lead c-err', x + 20, y + 2, 'none')];
  return [circle('v-dot', x + 7, y - 5, 3.6), text(isLow(profile) ? 'lead c-err' : 'lead', x + 20, y + 2, [formatNumber(worst, 1, 'down'), unit('V')])];
}

/** How far from the limit, and the limit itself. */
function margin(profile: LoopProfile, x: number, y: number): readonly Mark[] {
  const worst = profile.stations.at(-1)?.worstV ?? null;
  if (profile.minV === null) return [];
  if (worst === null) return [path('v-min', `M${x} ${y - 4}h14`), text('c-err', x + 22, y, `it takes at least ${formatNumber(profile.minV, 1)} V`)];
  const low = isLow(profile);
  const by = formatNumber(Math.abs(worst - profile.minV), 1, low ? 'up' : 'down');
  return [path('v-min', `M${x} ${y - 4}h14`), text(low ? 'c-err' : '', x + 22, y, [{ cls: 'strong', text: by }, unit('V'), low ? ' below' : ' above', ` the lowest, ${formatNumber(profile.minV, 1)} V`])];
}
