import { importHeadings, importTexts } from '#schema';
import { sql } from 'drizzle-orm';
import type { Tx } from '../platform/database.ts';
import { type FieldKey, isFieldKey, type Remembered, type ToRemember } from './reading/index.ts';

/** How the organisation mapped columns and texts before. */
export async function findRemembered(tx: Tx): Promise<Remembered> {
  const [headings, texts] = [await tx.select().from(importHeadings), await tx.select().from(importTexts)];
  const known = headings.filter(({ field }) => field === null || isFieldKey(field));
  const byField = new Map<string, Map<string, string | null>>();
  for (const { field, text, value } of texts) byField.set(field, (byField.get(field) ?? new Map<string, string | null>()).set(text, value));
  return { headings: new Map(known.map(({ heading, field }) => [heading, field as FieldKey | null])), texts: byField };
}

/** Keeps how a file was mapped; what is said anew replaces what was said before. */
export async function remember(tx: Tx, orgId: string, { headings, texts }: ToRemember): Promise<void> {
  const now = new Date();
  if (headings.length > 0) {
    await tx.insert(importHeadings).values(headings.map(({ heading, field }) => ({ orgId, heading, field, usedAt: now })))
      .onConflictDoUpdate({ target: [importHeadings.orgId, importHeadings.heading], set: { field: sql`excluded.field`, usedAt: now } });
  }
  if (texts.length > 0) {
    await tx.insert(importTexts).values(texts.map(({ field, text, value }) => ({ orgId, field, text, value, usedAt: now })))
      .onConflictDoUpdate({ target: [importTexts.orgId, importTexts.field, importTexts.text], set: { value: sql`excluded.value`, usedAt: now } });
  }
}
