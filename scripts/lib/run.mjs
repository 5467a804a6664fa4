import { spawn } from 'node:child_process';
import { ROOT } from './paths.mjs';
import { Trouble } from './say.mjs';

/**
 * Runs a program to its end with this terminal's output.
 * @param {string} program
 * @param {string[]} args
 * @param {{ env?: NodeJS.ProcessEnv, cwd?: string }} [options]
 * @returns {Promise<number>} its exit code; 1 when a signal ended it
 */
export function run(program, args, { env = process.env, cwd = ROOT } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { cwd, env, stdio: 'inherit' });
    child.once('error', reject);
    child.once('close', (code) => resolve(code ?? 1));
  });
}

/**
 * Runs a program and gives what it printed; its errors go to this terminal.
 * @param {string} program
 * @param {string[]} args
 * @param {{ env?: NodeJS.ProcessEnv }} [options]
 * @returns {Promise<{ code: number, output: string }>}
 */
export function read(program, args, { env = process.env } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { cwd: ROOT, env, stdio: ['inherit', 'pipe', 'inherit'] });
    let output = '';
    child.stdout.setEncoding('utf8').on('data', (text) => (output += text));
    child.once('error', reject);
    child.once('close', (code) => resolve({ code: code ?? 1, output }));
  });
}

/**
 * Runs a program and gives all it printed, its errors too.
 * @param {string} program @param {string[]} args @param {{ env?: NodeJS.ProcessEnv, input?: string }} [options]
 * @returns {Promise<{ code: number, output: string, errors: string }>}
 */
export function readAll(program, args, { env = process.env, input = '' } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { cwd: ROOT, env, stdio: ['pipe', 'pipe', 'pipe'] });
    let output = '';
    let errors = '';
    child.stdout.setEncoding('utf8').on('data', (text) => (output += text));
    child.stderr.setEncoding('utf8').on('data', (text) => (errors += text));
    child.stdin.on('error', () => undefined).end(input);
    child.once('error', reject);
    child.once('close', (code) => resolve({ code: code ?? 1, output, errors }));
  });
}

/**
 * Runs a program that has to succeed.
 * @param {string} sentence what to say when it does not
 * @param {string} program
 * @param {string[]} args
 * @param {{ env?: NodeJS.ProcessEnv, cwd?: string }} [options]
 */
export async function mustRun(sentence, program, args, options) {
  if ((await run(program, args, options)) !== 0) throw new Trouble(sentence);
}
