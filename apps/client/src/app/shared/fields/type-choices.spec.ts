import { describe, expect, it } from 'vitest';
import { typeChoices } from './type-choices';

const type = (name: string, typeVersion: number) => ({ id: `${name}-${typeVersion}`, name, typeVersion });
const types = [type('Supply 20', 1), type('Supply 5', 1), type('Supply 5', 3), type('Supply 5', 2)];

describe('typeChoices', () => {
  it('offers the latest version of each name, by name, and says which version it is beyond the first', () => {
    expect(typeChoices(types)).toEqual([{ value: 'Supply 5-3', label: 'Supply 5, version 3' }, { value: 'Supply 20-1', label: 'Supply 20' }]);
  });

  it('keeps the version in use beside the latest', () => {
    expect(typeChoices(types, 'Supply 5-1').map(({ label }) => label)).toEqual(['Supply 5, version 3', 'Supply 5', 'Supply 20']);
    expect(typeChoices(types, 'Supply 5-3')).toHaveLength(2);
  });
});
