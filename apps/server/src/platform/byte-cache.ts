interface Entry {
  readonly value: unknown;
  readonly bytes: number;
}

/** Values that can be made again, kept while there is room; the one longest unused goes first. */
export class ByteCache {
  private readonly entries = new Map<string, Entry>();
  private bytes = 0;

  constructor(private readonly mostBytes: number) {}

  get<T>(key: string): T | undefined {
    const found = this.entries.get(key);
    if (!found) return undefined;
    // A Map keeps the order of insertion: the latest used goes to its end.
    this.entries.delete(key);
    this.entries.set(key, found);
    return found.value as T;
  }

  /** Keeps it, also where it alone is larger than the room: whoever made it wants it next. */
  put(key: string, value: unknown, bytes: number): void {
    this.drop(key);
    this.entries.set(key, { value, bytes });
    this.bytes += bytes;
    for (const oldest of this.entries.keys()) {
      if (this.bytes <= this.mostBytes || this.entries.size === 1) return;
      this.drop(oldest);
    }
  }

  drop(key: string): void {
    this.bytes -= this.entries.get(key)?.bytes ?? 0;
    this.entries.delete(key);
  }
}
