/** Chance that is the same in every run: all draws come from one text. */
export interface Random {
  /** 0 up to, not including, 1. */
  next(): number;
  /** A whole number, both ends included. */
  whole(least: number, most: number): number;
  /** One of several. */
  pick<T>(from: readonly T[]): T;
}

/** Draws that follow from a text, by the generator sfc32 (Doty-Humphrey, PractRand). */
export function randomOf(text: string): Random {
  const next = sfc32(fourWords(text));
  const whole = (least: number, most: number): number => least + Math.floor(next() * (most - least + 1));
  return { next, whole, pick: (from) => from[whole(0, from.length - 1)] };
}

type Words = readonly [number, number, number, number];

/** Four 32-bit words of FNV-1a, each begun elsewhere, so that like texts give unlike words. */
function fourWords(text: string): Words {
  const word = (start: number): number => {
    let hash = start;
    for (let i = 0; i < text.length; i++) hash = Math.imul(hash ^ text.charCodeAt(i), 0x01000193);
    return hash >>> 0;
  };
  return [word(0x811c9dc5), word(0x9e3779b9), word(0x85ebca6b), word(0xc2b2ae35)];
}

/** The first draws still show the seed. */
const DISCARDED = 16;

function sfc32([first, second, third, fourth]: Words): () => number {
  let [a, b, c, d] = [first, second, third, fourth];
  const next = (): number => {
    const sum = (a + b + d) | 0;
    d = (d + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = (((c << 21) | (c >>> 11)) + sum) | 0;
    return (sum >>> 0) / 2 ** 32;
  };
  for (let i = 0; i < DISCARDED; i++) next();
  return next;
}
