// Makes src/server/auth/common-passwords.json from a list of passwords, commonest first (a JSON array of texts).
// Kept are those long enough to be somebody's whole password, and the commonest bodies of one; each as a short hash,
// because a good part of them is not fit to print. Usage: node scripts/make-common-passwords.mjs LIST.json SOURCE
import { createHash } from 'node:crypto';
import { readFileSync, writeFileSync } from 'node:fs';

const [listPath, source] = process.argv.slice(2);
if (listPath === undefined || source === undefined) throw new Error('usage: make-common-passwords.mjs LIST.json SOURCE');
const SHORTEST = 12;
const BODIES = 12_000;

const list = JSON.parse(readFileSync(listPath, 'utf8')).map((word) => word.normalize('NFKC').toLowerCase());
const bodyOf = (word) => word.replace(/^[^\p{L}]+|[^\p{L}]+$/gu, '');
const bodies = list.map(bodyOf).filter((body) => body.length >= 4).slice(0, BODIES);
const kept = new Set([...list.filter((word) => word.length >= SHORTEST), ...bodies]);
const hashes = [...kept].map((word) => createHash('sha256').update(word).digest().subarray(0, 6)).sort(Buffer.compare);
const file = new URL('../src/server/auth/common-passwords.json', import.meta.url);
writeFileSync(file, `${JSON.stringify({ source, hashes: Buffer.concat(hashes).toString('base64') }, null, 2)}\n`);
console.log(`${kept.size} passwords kept`);
