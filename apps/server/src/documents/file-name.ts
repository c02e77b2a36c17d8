/**
 * A file name that every system takes and no header breaks: small letters, digits and dashes.
 *
 * @param parts for instance the project's name and what the document is
 * @param extension without its dot
 */
export function safeFileName(parts: readonly string[], extension: string): string {
  const slugs = parts.map(slugOf).filter((part) => part !== '');
  return `${slugs.join('-') || 'document'}.${extension}`;
}

/** Enough to tell projects apart, short enough for every file system. */
const LONGEST_PART = 60;

function slugOf(text: string): string {
  return text
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, LONGEST_PART)
    .replace(/^-+|-+$/g, '');
}
