import type { EditableCollection } from '#contract';

export type CollectionName = EditableCollection | 'projects';
