// Runs every gate, then every test, and prints what passed and failed. The README's test command.
import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';

const gates = ['lint', 'types', 'build', 'format', 'deps', 'unused'];
/** Each line is one run: unit and component tests together, the rest on their own, for they start servers. */
const suites = [['unit', 'client'], ['api'], ['e2e']];
const gatesAtOnce = 2;
const began = Date.now();
const failures = [];
let passed = 0;

const seconds = (from) => `${((Date.now() - from) / 1000).toFixed(1)} s`;

function run(command, args, { quiet = false } = {}) {
  const child = spawn(command, args, {
    stdio: ['ignore', quiet ? 'pipe' : 'inherit', quiet ? 'pipe' : 'inherit'],
    env: { ...process.env, FORCE_COLOR: '0', NO_COLOR: '1' },
  });
  let said = '';
  child.stdout?.on('data', (chunk) => (said += chunk));
  child.stderr?.on('data', (chunk) => (said += chunk));
  return new Promise((resolve) => child.on('close', (code) => resolve({ isGood: code === 0, said })));
}

async function runGates() {
  const waiting = [...gates];
  const lane = async () => {
    for (let gate = waiting.shift(); gate !== undefined; gate = waiting.shift()) {
      const from = Date.now();
      const { isGood, said } = await run('npm', ['run', '--silent', gate], { quiet: true });
      console.log(`${isGood ? 'passed' : 'FAILED'}  ${gate}  ${seconds(from)}`);
      if (isGood) passed += 1;
      else {
        console.log(said);
        failures.push(gate);
      }
    }
  };
  await Promise.all(Array.from({ length: gatesAtOnce }, lane));
}

async function runSuite(projects, folder) {
  const from = Date.now();
  const file = path.join(folder, `${projects[0]}.json`);
  const chosen = projects.flatMap((project) => ['--project', project]);
  await run('npx', ['vitest', 'run', ...chosen, '--reporter=default', '--reporter=json', `--outputFile.json=${file}`]);
  console.log(`${projects.join(' and ')} tests took ${seconds(from)}`);
  if (!existsSync(file)) {
    failures.push(`${projects.join(', ')}: no results`);
    return;
  }
  const results = JSON.parse(readFileSync(file, 'utf8'));
  passed += results.numPassedTests;
  for (const { name, status, assertionResults, message } of results.testResults) {
    const where = path.relative('.', name);
    const broken = assertionResults.filter((each) => each.status === 'failed');
    if (status === 'failed' && broken.length === 0) failures.push(`${where}: ${message.split('\n')[0]}`);
    failures.push(...broken.map(({ fullName }) => `${where}: ${fullName}`));
  }
}

const browsers = [process.env.CHROMIUM, '/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];
const hasBrowser = browsers.some((file) => file && existsSync(file));
if (!hasBrowser) {
  console.log(
    'No browser found. The browser tests need Chromium: apt-get install chromium, or set CHROMIUM to its path.',
  );
  failures.push('browser tests: no browser');
}

await runGates();
const folder = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-results-'));
for (const projects of suites) if (hasBrowser || !projects.includes('e2e')) await runSuite(projects, folder);

for (const failure of failures) console.log(`FAILED  ${failure}`);
console.log(`All of it took ${seconds(began)}`);
console.log(`${passed} passed, ${failures.length} failed`);
process.exit(failures.length === 0 ? 0 : 1);
