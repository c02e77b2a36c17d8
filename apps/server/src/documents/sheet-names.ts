const LONGEST = 31;

/**
 * Names for the sheets of a workbook: at most 31 characters, none of those that workbooks refuse, no two
 * alike whatever their case.
 */
export function sheetNames(wanted: readonly string[]): string[] {
  const taken = new Set<string>();
  return wanted.map((name) => {
    const base = name.replace(/[*?:\\/[\]]/g, '-').replaceAll("'", '’').trim() || 'Sheet';
    let given = base.slice(0, LONGEST);
    for (let n = 2; taken.has(given.toLowerCase()); n++) given = `${base.slice(0, LONGEST - 4)} ${n}`;
    taken.add(given.toLowerCase());
    return given;
  });
}
