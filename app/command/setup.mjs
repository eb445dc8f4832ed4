// Sets up what is missing and builds what is stale, then starts the tool or runs the tests. Plain JavaScript without
// dependencies: it runs before anything is installed.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
const [task, ...words] = process.argv.slice(2);
const npm = process.platform === 'win32' ? 'npm.cmd' : 'npm';

if (Number(process.versions.node.split('.')[0]) < 20) {
  process.stderr.write(`Halosieve needs Node.js 20 or newer; this is ${process.versions.node}.\n`);
  process.exit(2);
}
install();
build();
if (task === 'start') start();
else test();

function install() {
  const stamp = join(root, 'node_modules/.halosieve-installed');
  const lock = hash(['package-lock.json']);
  if (existsSync(stamp) ? readFileSync(stamp, 'utf8') === lock : installedByHand()) return;
  say('Setting up: npm ci');
  run(npm, ['ci', '--no-audit', '--no-fund', '--loglevel', 'error']);
  writeFileSync(stamp, lock);
}

/** Whether npm itself was run after the lock file last changed. */
function installedByHand() {
  const note = join(root, 'node_modules/.package-lock.json');
  return existsSync(note) && statSync(note).mtimeMs >= statSync(join(root, 'package-lock.json')).mtimeMs;
}

function build() {
  const stamp = join(root, 'out/.built');
  const sources = hash([
    'package-lock.json',
    'package.json',
    'electron.config.ts',
    'svelte.config.js',
    'tsconfig.json',
    'app',
    'core',
  ]);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === sources) return;
  say('Building');
  run(npm, ['run', '--silent', 'build']);
  mkdirSync(dirname(stamp), { recursive: true });
  writeFileSync(stamp, sources);
}

function start() {
  fetchElectron();
  // npm runs scripts in the package's folder; paths are meant from where the user stands.
  const cwd = process.env.INIT_CWD ?? process.cwd();
  process.exitCode = runFree(process.execPath, [join(root, 'out/main/halosieve.js'), 'open', ...words], cwd);
}

/** Tries once to fetch Electron's binary, where a window could be shown. */
function fetchElectron() {
  const display = ['darwin', 'win32'].includes(process.platform) || process.env.DISPLAY || process.env.WAYLAND_DISPLAY;
  const tried = join(root, 'node_modules/.halosieve-electron');
  if (
    !display ||
    words.includes('--browser') ||
    existsSync(join(root, 'node_modules/electron/path.txt')) ||
    existsSync(tried)
  )
    return;
  say('Fetching Electron once; without it the window opens in the local browser');
  spawnSync(process.execPath, [join(root, 'node_modules/electron/install.js')], {
    cwd: root,
    stdio: 'ignore',
    timeout: 60_000,
  });
  writeFileSync(tried, '');
}

function test() {
  run(npm, ['run', '--silent', 'check']);
  process.exitCode = runFree(process.execPath, [join(root, 'node_modules/vitest/vitest.mjs'), 'run', ...words]);
  const lacking = [
    ['/usr/bin/chromium', 'the journeys in a real browser (chromium)'],
    ['/usr/lib/python3/dist-packages/astropy', 'the comparison with astropy (python3-astropy)'],
  ].filter(([path]) => !existsSync(path));
  for (const [, what] of lacking) say(`Skipped for want of a program: ${what}`);
  if (!existsSync(join(root, 'node_modules/electron/path.txt')))
    say('Skipped for want of its binary: the real run of the Electron application');
}

/** Hash over files, and over every file of folders, by name and content. */
function hash(names) {
  const sum = createHash('sha256');
  const add = (name) => {
    const path = join(root, name);
    if (statSync(path).isDirectory()) {
      for (const inner of readdirSync(path).sort()) add(`${name}/${inner}`);
    } else sum.update(name).update('\0').update(readFileSync(path));
  };
  names.forEach(add);
  return sum.digest('hex');
}

function run(command, args) {
  const code = runFree(command, args);
  if (code !== 0) process.exit(code);
}

function runFree(command, args, cwd = root) {
  // A Ctrl-C reaches the child too; it decides how to end.
  process.on('SIGINT', () => undefined);
  const { status, error } = spawnSync(command, args, {
    cwd,
    stdio: 'inherit',
    shell: process.platform === 'win32' && command === npm,
  });
  if (error) say(`${command} could not be run: ${error.message}`);
  return status ?? 1;
}

function say(line) {
  process.stdout.write(`${line}\n`);
}
