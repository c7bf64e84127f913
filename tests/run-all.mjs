// Runs every gate, then every test, and prints what passed and failed. The README's test command.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';

const gates = ['types', 'lint', 'format', 'deps', 'unused', 'build'];
const projects = ['unit', 'client', 'api', 'e2e'];
const run = (command, args) =>
  spawnSync(command, args, { stdio: 'inherit', env: { ...process.env, FORCE_COLOR: '0' } }).status === 0;

const browser = [process.env.CHROMIUM, '/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'].find(
  (file) => file && existsSync(file),
);
if (browser === undefined)
  console.log(
    'No browser found. The browser tests need Chromium: apt-get install chromium, or set CHROMIUM to its path.',
  );

let passed = 0;
let failed = browser === undefined ? 1 : 0;
const failures = browser === undefined ? ['no browser'] : [];
const began = Date.now();

for (const gate of gates) {
  const from = Date.now();
  const isGood = run('npm', ['run', '--silent', gate]);
  console.log(`${isGood ? 'passed' : 'FAILED'}  ${gate}  ${((Date.now() - from) / 1000).toFixed(1)} s`);
  if (isGood) passed += 1;
  else {
    failed += 1;
    failures.push(gate);
  }
}

const folder = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-results-'));
for (const project of projects) {
  if (project === 'e2e' && browser === undefined) continue;
  const file = path.join(folder, `${project}.json`);
  run('npx', [
    'vitest',
    'run',
    '--project',
    project,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${file}`,
  ]);
  const results = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null;
  if (results === null) {
    failed += 1;
    failures.push(`${project}: no results`);
    continue;
  }
  passed += results.numPassedTests;
  failed += results.numFailedTests;
  for (const { name, status, assertionResults, message } of results.testResults) {
    const broken = assertionResults.filter((each) => each.status === 'failed');
    if (status === 'failed' && broken.length === 0) {
      failed += 1;
      failures.push(`${path.relative('.', name)}: ${message.split('\n')[0]}`);
    }
    failures.push(...broken.map(({ fullName }) => `${path.relative('.', name)}: ${fullName}`));
  }
}

for (const failure of failures) console.log(`FAILED  ${failure}`);
console.log(`All of it took ${((Date.now() - began) / 1000).toFixed(0)} s.`);
console.log(`${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);
