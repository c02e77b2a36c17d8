import { parseArgs } from 'node:util';
import { LaunchError } from './launch-error.mjs';

const USAGE = 'Usage: npm run seed -- --lanes N [--seed S] [--name NAME] [--org ORGANISATION]';
const LEAST_LANES = 100;
const MOST_LANES = 50_000;
/** Beyond it, seeds would no longer be exact whole numbers. */
const MOST_SEED = 2 ** 31 - 1;
const LONGEST_NAME = 200;

/**
 * What `npm run seed` is told on its command line.
 *
 * @param {string[]} args
 * @returns {{ lanes: number, seed: number, organisation: string, name?: string }}
 * @throws {LaunchError} saying what is wrong and how it is used
 */
export function seedArguments(args) {
  const { lanes, seed, name, org } = parsed(args);
  if (lanes === undefined) throw new LaunchError(`Say how many lanes, from ${LEAST_LANES} to ${MOST_LANES}.\n${USAGE}`);
  const title = name?.trim();
  if (title !== undefined && (title === '' || title.length > LONGEST_NAME)) {
    throw new LaunchError(`--name needs 1 to ${LONGEST_NAME} characters.\n${USAGE}`);
  }
  return {
    lanes: wholeNumber('--lanes', lanes, LEAST_LANES, MOST_LANES),
    seed: wholeNumber('--seed', seed, 0, MOST_SEED),
    organisation: org,
    ...(title !== undefined && { name: title }),
  };
}

function parsed(args) {
  const text = (other) => ({ type: 'string', ...(other !== undefined && { default: other }) });
  try {
    return parseArgs({ args, options: { lanes: text(), seed: text('1'), name: text(), org: text('Brackwater') } }).values;
  } catch (error) {
    throw new LaunchError(`${error.message}\n${USAGE}`);
  }
}

function wholeNumber(option, text, least, most) {
  const value = /^\d+$/.test(text) ? Number(text) : NaN;
  if (value >= least && value <= most) return value;
  throw new LaunchError(`${option} ${text} is not a whole number from ${least} to ${most}.\n${USAGE}`);
}
