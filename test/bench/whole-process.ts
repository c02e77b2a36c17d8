/** The whole job in one process: reads a design as JSON, assesses it, writes figures and findings as JSON. */
import { assess, type Design } from '#calc';
import { readFileSync, writeFileSync } from 'node:fs';

const [from, to] = process.argv.slice(2);
const { points, lanes, circuits, supplies, findings } = assess(JSON.parse(readFileSync(from, 'utf8')) as Design);
const rows = [...lanes].map(([id, { plan, timed, worst }]) => ({ id, plan, timed, volts: worst?.volts ?? null }));
writeFileSync(to, JSON.stringify({ points: [...points], lanes: rows, circuits: [...circuits], supplies: [...supplies], findings }));
