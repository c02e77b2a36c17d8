import { latestVersions } from '../shared/fields/latest-versions';
import { versionsOf } from './versions';

const entry = (name: string, typeVersion: number) => ({ id: `${name}-${typeVersion}`, name, typeVersion });
const entries = [entry('Cable 10', 1), entry('Cable 2', 2), entry('Cable 2', 10), entry('Cable 2', 1)];

describe('versions', () => {
  it('shows the latest version of each name, names in the order people count', () => {
    expect(latestVersions(entries).map((e) => e.id)).toEqual(['Cable 2-10', 'Cable 10-1']);
  });

  it('lists the versions of a name from the latest on', () => {
    expect(versionsOf(entries, 'Cable 2').map((e) => e.typeVersion)).toEqual([10, 2, 1]);
  });

  it('takes entries without versions as they are', () => {
    expect(latestVersions([{ id: 'b', name: 'B' }, { id: 'a', name: 'A' }]).map((e) => e.id)).toEqual(['a', 'b']);
  });
});
