import { describe, expect, it } from 'vitest';
import { buildDesign, buildFourCoreType, buildLane } from '#support/design-builder.ts';
import { assess } from '../assess.ts';
import type { ProtectionLevel, Zone } from '../design.ts';
import { suitability } from './zone.ts';

describe('protection levels in zones (IEC 60079-14)', () => {
  it.each<[Zone, ProtectionLevel[], string]>([
    ['0', ['Ga'], 'suitable'], ['0', ['Gb'], 'unsuitable'], ['1', ['Gb'], 'suitable'], ['1', ['Ga'], 'suitable'], ['2', ['Gc'], 'suitable'],
    ['20', ['Da'], 'suitable'], ['20', ['Db'], 'unsuitable'], ['21', ['Dc'], 'unsuitable'], ['21', ['Db'], 'suitable'], ['22', ['Dc'], 'suitable'],
    ['22', ['Ga'], 'unsuitable'], ['22', ['Gc', 'Dc'], 'suitable'], ['21', [], 'unknown'], ['none', [], 'suitable'],
  ])('zone %s with %j is %s', (zone, levels, expected) => {
    expect(suitability(zone, levels)).toBe(expected);
  });

  it('become an error, a warning, or one note for all points without a zone', () => {
    const codes = (zone: Zone | null, protectionLevels: ProtectionLevel[]) =>
      assess(buildDesign({ lanes: [buildLane('P-01', {}, { zone }), buildLane('P-02', {}, { zone })], dispenserTypes: [buildFourCoreType({ protectionLevels })] }))
        .findings.filter((f) => f.code.startsWith('AR')).map((f) => `${f.code} ${f.severity}`);
    expect(codes('21', ['Dc'])).toEqual(['AR-01 error', 'AR-01 error']);
    expect(codes('21', [])).toEqual(['AR-02 warning', 'AR-02 warning']);
    expect(codes(null, [])).toEqual(['AR-03 note']);
    expect(codes('22', ['Dc'])).toEqual([]);
  });

  it('note a type without a stated surface temperature, in a classified place only', () => {
    const codes = (zone: Zone, maxSurfaceC: number | null) =>
      assess(buildDesign({ lanes: [buildLane('P-01', {}, { zone })], dispenserTypes: [buildFourCoreType({ maxSurfaceC })] }))
        .findings.filter((f) => f.code.startsWith('AR')).map((f) => `${f.code} ${f.severity}`);
    expect(codes('22', null)).toEqual(['AR-04 note']);
    expect(codes('22', 85)).toEqual([]);
    expect(codes('none', null)).toEqual([]);
  });
});
