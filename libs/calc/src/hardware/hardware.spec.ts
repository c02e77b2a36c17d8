import { describe, expect, it } from 'vitest';
import {
  buildAssignment, buildCircuit, buildDesign, buildGroup, buildLane, buildModule, buildOutputType, buildSupply, buildSupplyType, type DesignParts,
} from '#support/design-builder.ts';
import { assess } from '../assess.ts';
import type { Finding } from '../findings.ts';
import { channelOfAddress, directAddress, parseAddress } from './address.ts';
import { lowestSupplyV } from '../wiring/supply-voltage.ts';
import { deratedA } from './supply-load.ts';

const twoCore = (count: number) => Array.from({ length: count }, (_, i) => buildLane(`P-${i}`, { typeId: 'type-2', wiring: 'two-core', cableLengthM: 5 }));
const onFirst = (count: number) => Array.from({ length: count }, (_, i) => buildAssignment(`P-${i}`, 'DO1', i));

function group(parts: DesignParts) {
  const result = assess(buildDesign({ modules: [buildModule()], moduleGroups: [buildGroup('DO1', 0), buildGroup('DO1', 1)], ...parts }));
  const find = (code: string): Finding | undefined => result.findings.find((f) => f.code === code);
  return { result, find, load: result.groups.get('DO1/0')! };
}

describe('direct addresses', () => {
  it('count a byte for each eight channels', () => {
    expect(directAddress('output', 4, 3)).toBe('%QX4.3');
    expect(directAddress('input', 6, 15)).toBe('%IX7.7');
    expect(() => directAddress('output', -1, 0)).toThrow(RangeError);
    expect(() => directAddress('output', 0, 1.5)).toThrow(RangeError);
  });

  it('are read as IEC 61131-3 writes a bit, and refused otherwise', () => {
    expect(parseAddress(' %qx4.3 ')).toEqual({ kind: 'output', byte: 4, bit: 3 });
    expect(parseAddress('%I12.0')).toEqual({ kind: 'input', byte: 12, bit: 0 });
    for (const text of ['%QX4.8', '%QW4', 'QX4.3', '%MX1.1', '%QX4', '%QX4.3.1', '']) expect(parseAddress(text)).toBeNull();
  });

  it('find the channel of a module, and none on another kind or outside', () => {
    const at = (text: string) => channelOfAddress(parseAddress(text)!, buildModule(), buildOutputType());
    expect([at('%QX4.0'), at('%QX5.7'), at('%QX6.0'), at('%QX3.7'), at('%IX4.0')]).toEqual([0, 15, null, null, null]);
  });

  it('of two modules may not overlap on one controller; outputs and inputs are apart', () => {
    const second = buildModule({ id: 'DO2', name: 'DO2', slot: 2 });
    const inputs = buildModule({ id: 'DI1', name: 'DI1', typeId: 'in-16', baseByte: 4, slot: 3 });
    const overlap = (baseByte: number) => group({ modules: [buildModule(), { ...second, baseByte }, inputs] }).find('IO-07');
    expect(overlap(5)).toMatchObject({ subject: { label: 'PLC1 DO2' }, remedy: 'Set the base byte of DO2 to 6 or higher.' });
    expect(overlap(6)).toBeUndefined();
  });
});

describe('loads of groups and modules', () => {
  it('add the k largest of each circuit', () => {
    const { load, find } = group({ lanes: twoCore(6), assignments: onFirst(6), circuits: [buildCircuit({ concurrencyLimit: 3 })] });
    expect(load.worstA).toBeCloseTo(3 * 0.28, 12);
    expect(load.allOnA).toBeCloseTo(6 * 0.28, 12);
    expect(load.worstSet).toHaveLength(3);
    expect(find('IO-03')).toBeUndefined();
  });

  it('say what is over, rounded up, and which k would do', () => {
    const { find } = group({ lanes: twoCore(6), assignments: onFirst(6), moduleTypes: [buildOutputType({ groupA: 1.5 })] });
    expect(find('IO-03')).toMatchObject({
      severity: 'error', title: '1.68\u2009A in the group, rating 1.50\u2009A', remedy: 'Set k to 5 on C1, or spread the dispensers over two groups.',
      subject: { id: 'DO1/0', label: 'PLC1 DO1, channels 0–7' },
    });
  });

  it('note what only the program keeps', () => {
    const { find } = group({ lanes: twoCore(6), assignments: onFirst(6), moduleTypes: [buildOutputType({ groupA: 1.5 })], circuits: [buildCircuit({ concurrencyLimit: 5 })] });
    expect(find('IO-03')).toBeUndefined();
    expect(find('IO-04')).toMatchObject({ severity: 'note' });
  });

  it('count four-core channels by their pulse input only', () => {
    const { load } = group({ lanes: [buildLane('P-0')], assignments: onFirst(1) });
    expect(load.worstA).toBe(0.005);
  });

  it('check channel rating and starting peak', () => {
    const { find } = group({ lanes: twoCore(1), assignments: onFirst(1), moduleTypes: [buildOutputType({ channelA: 0.25, channelPeakA: 0.4 })] });
    expect(find('IO-01')?.title).toBe('0.28\u2009A on the channel, rating 0.25\u2009A');
    expect(find('IO-02')?.compared[0]).toMatchObject({ value: 0.45, limit: 0.4 });
  });
});

describe('relay outputs', () => {
  const relay = buildOutputType({ technology: 'relay', polarity: 'sinking', minLoadA: 0.01, ratedOperations: 5_000 });

  it('need their least load and last as long as the policy asks', () => {
    const { find, result } = group({ lanes: [buildLane('P-0')], assignments: onFirst(1), moduleTypes: [relay] });
    expect(find('SG-08')?.compared[0]).toMatchObject({ value: 0.005, limit: 0.01 });
    const pulses = result.lanes.get('P-0')!.plan!.pulsesPerYear;
    expect(find('SG-09')?.compared[0]).toMatchObject({ value: pulses * 10, limit: 5_000 });
  });

  it('take either polarity', () => {
    expect(group({ lanes: [buildLane('P-0')], assignments: onFirst(1), moduleTypes: [relay] }).find('SG-03')).toBeUndefined();
  });
});

describe('supplies', () => {
  it('lose rating by the degree above their derating temperature', () => {
    expect(deratedA(buildSupplyType(), 40)).toBe(10);
    expect(deratedA(buildSupplyType(), 60)).toBeCloseTo(7.5, 12);
    expect(deratedA(buildSupplyType(), 200)).toBe(0);
  });

  it('are lowest at set voltage less tolerance, or 24 V − 15 % where none is stated', () => {
    expect(lowestSupplyV(buildSupply(), buildSupplyType({ tolerancePercent: 2 }))).toBeCloseTo(23.52, 12);
    expect(lowestSupplyV(buildSupply(), buildSupplyType({ tolerancePercent: null }))).toBe(20.4);
  });

  it('carry standing load, timed lanes and the worst set, with margin', () => {
    const lanes = [...twoCore(3), buildLane('T', { method: 'timed', periodMonths: 6 }), buildLane('F')];
    const { result } = group({ lanes, supplies: [buildSupply({ otherLoadA: 1 })], circuits: [buildCircuit({ concurrencyLimit: 2 })] });
    const figures = result.supplies.get('supply')!;
    expect(figures.standingA).toBeCloseTo(1 + 0.25 + 0.02, 12);
    expect(figures.worstA).toBeCloseTo(1.27 + 2 * 0.28, 12);
    expect(figures.demandA).toBeCloseTo(1.83 * 1.25, 12);
    expect(figures.headroomA).toBeCloseTo(10 - 2.2875, 12);
    expect(figures.headroomDispensers).toBe(Math.floor(7.7125 / (0.28 * 1.25)));
  });

  it('are found over their rating', () => {
    const { find } = group({ lanes: twoCore(3), supplyTypes: [buildSupplyType({ ratedA: 1 })] });
    expect(find('SU-01')).toMatchObject({ severity: 'error', title: '1.05\u2009A asked of the supply, rating 1.00\u2009A at 40 °C' });
  });
});

describe('a redundant pair of supplies', () => {
  it('counts one rating and says so', () => {
    const over = { lanes: twoCore(3), supplyTypes: [buildSupplyType({ ratedA: 1 })] };
    const single = group(over).find('SU-01')!;
    const pair = group({ ...over, supplies: [buildSupply({ redundant: true })] }).find('SU-01')!;
    expect(pair.title).toBe(single.title);
    expect(pair.detail).toContain('One of the redundant pair must carry all, so one rating counts; both must be equal.');
    expect(single.detail).not.toContain('pair');
  });
});
