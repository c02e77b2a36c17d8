import { type Alternative, alternatives, formatDays, formatNumber, formatVolume, NOTHING, type Project, type RankBy, volumeFigure } from '#calc';
import type { PointRow } from '../point-rows';

/** Cartridges and doses of a dispenser type against each other, for one point. */
export interface AlternativesView {
  /** Why there are none, as an instruction. */
  readonly refusal: string | null;
  readonly dosesUl: readonly number[];
  readonly lines: readonly CartridgeLine[];
  /** What is set now; null while it is blank or not one that the type gives. */
  readonly now: Alternative | null;
  readonly first: Alternative | null;
  /** Stands beside now and the first unless another is picked: the next in rank. */
  readonly third: Alternative | null;
  readonly passing: number;
  readonly rejected: readonly RejectedGroup[];
}

/** A cartridge with all doses, in the order of `dosesUl`, and the life that the dose set now would give. */
export interface CartridgeLine {
  readonly cartridgeUl: number;
  readonly life: string;
  readonly cells: readonly Alternative[];
}

/** Neighbouring doses of a cartridge that fail for the same reason. */
export interface RejectedGroup {
  readonly what: string;
  readonly why: string;
}

export function alternativesView(row: PointRow, project: Project, rankBy: RankBy): AlternativesView {
  const { ranked, rejected, refusal } = alternatives({ ...row, project }, rankBy);
  const all = [...ranked, ...rejected];
  const dosesUl = unique(all.map((each) => each.doseUl));
  const cells = new Map(all.map((each) => [keyOf(each), each]));
  const set = { cartridgeUl: row.dispenser?.cartridgeUl ?? 0, doseUl: row.dispenser?.doseUl ?? 0 };
  const now = (row.dispenser?.method === 'pulse' && cells.get(keyOf(set))) || null;
  const first = ranked[0] ?? null;
  const lines = unique(all.map((each) => each.cartridgeUl)).map((cartridgeUl) => {
    const own = dosesUl.map((doseUl) => cells.get(keyOf({ cartridgeUl, doseUl }))!);
    const lifeAt = own.find((each) => each.doseUl === (now ?? first)?.doseUl) ?? own[0];
    return { cartridgeUl, life: lifeAt?.plan ? formatDays(lifeAt.plan.lifeDays) : NOTHING, cells: own };
  });
  return {
    refusal, dosesUl, lines, now, first, third: ranked.find((each) => each !== now && each !== first) ?? null,
    passing: ranked.length, rejected: rejectedGroups(rejected, dosesUl),
  };
}

/** Tells cartridge and dose apart from all others. */
export const keyOf = ({ cartridgeUl, doseUl }: Pick<Alternative, 'cartridgeUl' | 'doseUl'>): string => `${cartridgeUl}/${doseUl}`;

/** `160, 0.2`: cartridge and dose in cm³. */
export const pairText = ({ cartridgeUl, doseUl }: Pick<Alternative, 'cartridgeUl' | 'doseUl'>): string =>
  `${formatNumber(cartridgeUl / 1000)}, ${volumeFigure(doseUl)}`;

/** Where a year's cartridge changes fall, as parts of the year. */
export function changesInYear(lifeDays: number): readonly number[] {
  const YEAR = 365.25;
  const count = Math.min(60, Math.floor(YEAR / lifeDays));
  return Array.from({ length: count }, (_, index) => ((index + 1) * lifeDays) / YEAR);
}

/** What does not pass, in few lines: doses that follow each other and fail alike are told together. */
export function rejectedGroups(rejected: readonly Alternative[], dosesUl: readonly number[]): readonly RejectedGroup[] {
  const runs: Alternative[][] = [];
  for (const each of rejected) {
    const run = runs.at(-1);
    const last = run?.at(-1);
    const follows = last?.cartridgeUl === each.cartridgeUl && dosesUl.indexOf(each.doseUl) === dosesUl.indexOf(last.doseUl) + 1;
    if (run && last && follows && kindOf(last) === kindOf(each)) run.push(each);
    else runs.push([each]);
  }
  return runs.map((run) => {
    const cartridge = `${formatNumber(run[0].cartridgeUl / 1000)}\u2009cm³`;
    const whole = run.length === dosesUl.length;
    const doses = run.length === 1 ? volumeFigure(run[0].doseUl) : `${volumeFigure(run[0].doseUl)} to ${volumeFigure(run.at(-1)!.doseUl)}`;
    return { what: whole ? `${cartridge}, any dose` : `${cartridge}, ${doses}`, why: run[0].reasons.join('; ') };
  });
}

/** The dose as a sentence for those who listen. */
export function spoken(each: Alternative, interval: string): string {
  const outcome = each.passes ? `${interval}, rank ${each.rank}` : `does not pass: ${each.reasons.join('; ')}`;
  return `${formatVolume(each.cartridgeUl)} cartridge, ${formatVolume(each.doseUl)}: ${outcome}`;
}

/** A reason without its numbers, which differ from dose to dose. */
const kindOf = (each: Alternative): string => each.reasons.join('; ').replace(/[\d.,]+/g, '#');

const unique = (values: readonly number[]): readonly number[] => [...new Set(values)].sort((a, b) => a - b);
