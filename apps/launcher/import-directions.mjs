/**
 * ESLint rule: imports run one way (docs/architecture.md). Below are libs and db/schema, above them
 * the apps; inside the apps, features stand beside each other on a common floor.
 */
import { dirname, posix, relative, resolve, sep } from 'node:path';
import { root } from './paths.mjs';

/** The `imports` of package.json, as paths in the repository. */
const SHORT_NAMES = {
  '#calc': 'libs/calc/src/index.ts',
  '#contract': 'libs/contract/src/index.ts',
  '#documents': 'libs/documents/src/index.ts',
  '#program': 'libs/program/src/index.ts',
  '#schema': 'db/schema/index.ts',
};

/** What each part may import besides itself; `types` only as types. */
const PARTS = [
  { part: 'libs/calc/', may: [], types: [] },
  { part: 'libs/program/', may: ['libs/calc/'], types: [] },
  { part: 'libs/documents/', may: ['libs/calc/'], types: [] },
  { part: 'libs/contract/', may: [], types: ['libs/calc/'] },
  { part: 'db/schema/', may: [], types: [] },
  { part: 'db/', may: ['libs/', 'db/schema/'], types: [] },
  { part: 'apps/server/', may: ['libs/', 'db/schema/'], types: [] },
  { part: 'apps/client/', may: ['libs/calc/', 'libs/program/'], types: ['libs/contract/'] },
  { part: 'apps/launcher/', may: [], types: [] },
];

const isTest = (path) => /\.spec\.ts$|\.test\.mjs$/.test(path);

/**
 * @param {string} specifier as written in the import
 * @param {string} from path in the repository of the file that has it
 * @returns {string | undefined} path in the repository; undefined for packages
 */
export function resolveImport(specifier, from) {
  if (specifier.startsWith('.')) return posix.normalize(posix.join(dirname(from), specifier));
  if (specifier.startsWith('#support/')) return `test/support/${specifier.slice('#support/'.length)}`;
  return SHORT_NAMES[specifier];
}

/**
 * @param {string} from path in the repository
 * @param {string} to path in the repository
 * @param {boolean} typesOnly
 * @returns {string | undefined} why the import is against the rules, or undefined
 */
export function whyForbidden(from, to, typesOnly) {
  if (from.startsWith('test/') || (isTest(from) && to.startsWith('test/support/'))) return undefined;
  const rule = PARTS.find(({ part }) => from.startsWith(part));
  if (!rule) return undefined;
  if (!to.startsWith(rule.part)) return acrossParts(rule, to, typesOnly);
  if (rule.part === 'apps/server/') return withinServer(from, to);
  if (rule.part === 'apps/client/') return withinClient(from, to);
  return undefined;
}

function acrossParts({ part, may, types }, to, typesOnly) {
  const holds = (allowed) => to.startsWith(allowed);
  if (may.some(holds)) return undefined;
  if (types.some(holds)) return typesOnly ? undefined : `${part} may import types only from ${types.join(', ')}`;
  return `${part} may import only ${[...may, ...types].join(', ') || 'itself'}`;
}

/** routes → service → queries → schema; platform below all; a feature uses another's service. */
function withinServer(from, to) {
  const [mine, theirs] = [from, to].map((path) => featureOf(path, 'apps/server/src/'));
  if (mine === undefined) return undefined;
  if (theirs === undefined) return 'a feature imports nothing from the application that joins the features';
  if (theirs !== mine && mine === 'platform') return 'platform lies below the features';
  if (theirs !== mine && theirs !== 'platform' && ['queries', 'routes'].includes(layerOf(to))) {
    return "a feature uses another feature's service, not its queries or routes";
  }
  if (theirs === mine && leadsBack(layerOf(from), layerOf(to)))
    return 'routes import service, service imports queries, never back';
  return undefined;
}

const withoutFeature = (path) => path.split('/').slice(4).join('/');

/** From far below to the door; a file named for none of them may use all but the routes. */
const LAYERS = ['queries', 'service', 'routes'];

/** @returns {string | undefined} by the file's name: `service.ts`, `session-service.ts`, `service/rename.ts` */
function layerOf(path) {
  return isTest(path) ? 'routes' : /(?:^|[/-])(queries|service|routes)(?:\/|\.ts$|$)/.exec(withoutFeature(path))?.[1];
}

function leadsBack(from, to) {
  if (from === undefined) return to === 'routes';
  return to !== undefined && LAYERS.indexOf(to) > LAYERS.indexOf(from);
}

/** Features of the client share only core and shared. */
function withinClient(from, to) {
  const [mine, theirs] = [from, to].map((path) => featureOf(path, 'apps/client/src/app/'));
  if (mine === undefined || theirs === mine) return undefined;
  if (theirs === undefined) return to.startsWith('apps/client/src/app/') ? 'imports do not lead upward' : undefined;
  if (theirs === 'core' || theirs === 'shared') return undefined;
  return 'features share only core and shared, never each other';
}

/** @returns {string | undefined} name of the folder directly below `base`, if the file is in one */
function featureOf(path, base) {
  const [feature, ...rest] = path.startsWith(base) ? path.slice(base.length).split('/') : [];
  return rest.length > 0 ? feature : undefined;
}

const onlyTypes = (node) =>
  node.importKind === 'type' ||
  node.exportKind === 'type' ||
  (node.specifiers?.length > 0 && node.specifiers.every((specifier) => specifier.importKind === 'type'));

/** @type {import('eslint').Rule.RuleModule} */
export const importDirections = {
  meta: { type: 'problem', schema: [], messages: { against: 'Import of {{to}}: {{why}}.' } },
  create(context) {
    const from = relative(root, resolve(context.filename)).split(sep).join('/');
    const check = (node) => {
      const specifier = node.source?.value;
      const to = typeof specifier === 'string' ? resolveImport(specifier, from) : undefined;
      const why = to && whyForbidden(from, to, onlyTypes(node));
      if (why) context.report({ node: node.source, messageId: 'against', data: { to, why } });
    };
    return {
      ImportDeclaration: check,
      ImportExpression: check,
      ExportNamedDeclaration: check,
      ExportAllDeclaration: check,
    };
  },
};
