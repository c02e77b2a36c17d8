import { describe, expect, it } from 'vitest';
import { buildCircuit, buildDesign, buildLane, buildNode, buildSupplyType, buildTwoCoreType, type DesignParts } from '#support/design-builder.ts';
import { assess } from '../assess.ts';
import { FINDING_CODES } from '../finding-codes.ts';
import type { Circuit } from '../design.ts';
import type { Finding } from '../findings.ts';
import { overloadText } from './protection.ts';

function found(parts: DesignParts) {
  const { findings } = assess(buildDesign(parts));
  return (code: string): Finding | undefined => findings.find((f) => f.code === code);
}

describe('what a protective device does above its rating', () => {
  const says = (protection: Circuit['protection'], amps: number) => overloadText(buildCircuit({ protection, protectionA: 6 }), amps, 1.5);

  it('is told honestly for breakers (IEC 60898-1)', () => {
    expect(says('breaker-B', 6)).toBeNull();
    expect(says('breaker-B', 6.7)).toBe('6.70\u2009A with all on, above the 6.00\u2009A of C1’s protection, which need not act at all below 1.13 times its rating.');
    expect(says('breaker-B', 8)).toBe('8.00\u2009A with all on, above the 6.00\u2009A of C1’s protection: it may carry that for hours before it trips, or not trip.');
    expect(says('breaker-C', 9.64)).toBe('9.64\u2009A with all on, above the 6.00\u2009A of C1’s protection: it will trip sooner or later, not at once.');
    expect(says('breaker-B', 50)).toContain('it trips at once');
  });

  it('is left to curve and type data for the others', () => {
    expect(says('fuse', 9)).toContain('its time-current curve');
    expect(says('electronic', 8)).toContain('its type data');
  });

  it('is what PR-05 and the voltage findings say', () => {
    const lanes = Array.from({ length: 5 }, (_, i) => buildLane(`P-0${i}`, { typeId: 'type-2', wiring: 'two-core', cableLengthM: 5, nodeId: 'box' }));
    const find = found({
      lanes, dispenserTypes: [buildTwoCoreType({ runA: 0.5, minV: 22 })], cableNodes: [buildNode({ lengthM: 60, powerMm2: 1.5 })],
      circuits: [buildCircuit({ protectionA: 2, concurrencyLimit: 3 })],
    });
    expect(find('PR-05')?.title).toBe('2.50\u2009A if all run at once, protection 2.00\u2009A');
    expect(find('PR-05')?.detail).toContain('it may carry that for hours');
    expect(find('VD-01')?.detail).toContain('it may carry that for hours');
    expect(FINDING_CODES['PR-05'].means).not.toContain('trips');
  });
});

describe('a far end that does not trip', () => {
  const lanes = [buildLane('P-01', { cableLengthM: 100 })];

  it('names the supply, not the section, where the supply delivers too little', () => {
    const remedy = found({ lanes })('PR-02')!.remedy;
    expect(remedy).toBe('Choose electronic protection, a smaller rating, or a supply that delivers 45.00\u2009A.');
  });

  it('names the section where the supply delivers enough', () => {
    const remedy = found({ lanes, supplyTypes: [buildSupplyType({ shortCircuitA: 60 })] })('PR-02')!.remedy;
    expect(remedy).toBe('Choose electronic protection, a larger section, or a smaller rating.');
  });

  it('rests on a factor of ours for electronic protection', () => {
    const find = found({ lanes, circuits: [buildCircuit({ protection: 'electronic' })] });
    expect(find('PR-07')?.source).toBe('policy');
    expect(find('PR-07')?.remedy).toContain('larger section');
  });
});
