import { type FindTarget, matching } from './find-targets';

const target = (label: string, kind: FindTarget['kind'], detail = ''): FindTarget => ({ kind, label, detail, link: ['/'] });
const all = [target('Overview', 'page'), target('GC1-L11', 'point', 'Tail pulley'), target('%QX4.3', 'address', 'GC1-L11'), target('L1 spare', 'hardware')];

describe('matching', () => {
  it('offers the pages before anything is typed', () => {
    expect(matching(all, ' ').map((t) => t.label)).toEqual(['Overview']);
  });

  it('puts what begins with the words before what contains them, and these before what is described by them', () => {
    expect(matching(all, 'l1').map((t) => t.label)).toEqual(['L1 spare', 'GC1-L11', '%QX4.3']);
  });

  it('finds an address as it is written, and a point by its description', () => {
    expect(matching(all, '%qx4.3').map((t) => t.label)).toEqual(['%QX4.3']);
    expect(matching(all, 'tail').map((t) => t.label)).toEqual(['GC1-L11']);
  });

  it('shows at most a dozen', () => {
    expect(matching(Array.from({ length: 40 }, (_, i) => target(`P${i}`, 'point')), 'p')).toHaveLength(12);
  });
});
