import { dispenserView } from './dispenser-fields';
import type { Kind, KindView } from './field';
import { moduleView } from './module-fields';
import { cableView, greaseView, supplyView } from './other-fields';

/** Every kind of type, in the order shown. */
export const KIND_VIEWS: readonly KindView[] = [dispenserView, moduleView, cableView, supplyView, greaseView];

/** The view of a kind by its key, as an address names it; of dispensers where it names none. */
export const kindView = (kind: string | undefined): KindView => KIND_VIEWS.find((view) => view.kind === kind) ?? dispenserView;

export const isKind = (text: string | undefined): text is Kind => KIND_VIEWS.some((view) => view.kind === text);
