import type { Row } from './collection.ts';

/** For rows that people call by one of their texts. */
export const labelBy = (field: string) => (row: Row): string => {
  const value = row[field];
  return typeof value === 'string' ? value : '';
};
