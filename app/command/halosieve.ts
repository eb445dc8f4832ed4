import { parseArgs } from 'node:util';
import { ProblemError } from '../../core/table/problem';
import { problemText } from '../../core/table/wording';
import { apply } from './apply';
import { type Command, UsageError } from './command';
import { derive } from './derive';
import { faultLines } from './fault';
import { freeze } from './freeze';
import { inspect } from './inspect';
import { open } from './open';
import { standardOutput } from './output';
import { progressLine } from './progressline';
import { stopper } from './stopper';
import { verify } from './verify';
import { VERSION } from './version';

const COMMANDS: readonly Command[] = [inspect, derive, apply, freeze, verify, open];
const COMMON = { json: { type: 'boolean' }, help: { type: 'boolean', short: 'h' } } as const;

const progress = progressLine(process.stderr);
const { print, note } = standardOutput(progress.clear);
const stop = stopper(note);

process.exitCode = await main(process.argv.slice(2));

async function main([name, ...rest]: readonly string[]): Promise<number> {
  if (name === '--version') return say(VERSION);
  if (name === undefined || name === '--help' || name === '-h') {
    for (const line of programHelp()) (name === undefined ? note : print)(line);
    return name === undefined ? 2 : 0;
  }
  const command = COMMANDS.find((candidate) => candidate.name === name);
  if (!command) return misuse(`there is no command "${name}"; see halosieve --help`);
  return runCommand(command, rest);
}

async function runCommand(command: Command, args: string[]): Promise<number> {
  try {
    const { values, positionals } = parseArgs({
      args: joinedNegatives(args, command),
      options: { ...COMMON, ...command.options },
      allowPositionals: true,
    });
    if (values.help) {
      for (const line of commandHelp(command)) print(line);
      return 0;
    }
    const [least, most] = command.words;
    if (positionals.length < least || positionals.length > most) throw new UsageError(`usage: ${command.usage}`);
    return await command.run({
      words: positionals,
      values,
      signal: stop,
      onProgress: progress.show,
      print,
      note,
    });
  } catch (error) {
    return failed(error);
  } finally {
    progress.clear();
  }
}

/** Joins an option with a value like -99.9 or --, which would otherwise be taken for an option itself. */
function joinedNegatives(args: readonly string[], { options }: Command): string[] {
  return args.reduce<string[]>((joined, word) => {
    const before = joined.at(-1);
    const takesText = before?.startsWith('--') === true && options[before.slice(2)]?.type === 'string';
    return takesText && /^-+[\d.]*$/.test(word) ? [...joined.slice(0, -1), `${before}=${word}`] : [...joined, word];
  }, []);
}

function failed(error: unknown): number {
  if (error instanceof UsageError) return misuse(error.message);
  if (error instanceof TypeError && (error as NodeJS.ErrnoException).code?.startsWith('ERR_PARSE_ARGS'))
    return misuse(error.message);
  if (error instanceof ProblemError) {
    for (const problem of error.problems) note(problemText(problem));
    return error.problems.some(({ code }) => code === 'cancelled') ? 130 : 1;
  }
  faultLines(error).forEach(note);
  return 1;
}

function misuse(message: string): number {
  note(message);
  return 2;
}

function say(line: string): number {
  print(line);
  return 0;
}

function programHelp(): string[] {
  return [
    'halosieve: from mismatched catalogues of halo tracers to one frozen, documented sample',
    '',
    ...COMMANDS.map(({ name, summary }) => `  ${name.padEnd(8)} ${summary}`),
    '',
    'halosieve COMMAND --help says more. Exit codes: 0 it went well, 1 the data say no, 2 the command was misused.',
  ];
}

function commandHelp({ usage, summary, details }: Command): string[] {
  return [
    summary,
    '',
    `usage: ${usage}`,
    '',
    ...details.map((line) => `  ${line}`),
    '  --json  the answer for programs',
    '  --help  this text',
  ];
}
