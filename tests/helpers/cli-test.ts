import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { execa } from 'execa';
import { onTestFinished } from 'vitest';

const COMMAND = join(import.meta.dirname, '..', '..', 'dist', 'cli', 'steelyard.js');

/** What a command did: its streams as it wrote them, and its exit status. */
export interface Outcome {
  readonly stdout: string;
  readonly stderr: string;
  readonly status: number | undefined;
}

/** A folder of its own for one test, outside any repository, and the command run in it as a process. */
export class CliTest {
  readonly folder: string;
  private env: Record<string, string> = {};
  private input: string | undefined;

  constructor() {
    this.folder = mkdtempSync(join(tmpdir(), 'steelyard-test-'));
    onTestFinished(() => rmSync(this.folder, { recursive: true, force: true }));
  }

  /** Writes a file; the text loses the indentation of its first line. */
  file(name: string, content: string | Uint8Array): this {
    const path = join(this.folder, name);
    mkdirSync(dirname(path), { recursive: true });
    writeFileSync(path, typeof content === 'string' ? dedent(content) : content);
    return this;
  }

  withEnv(env: Record<string, string>): this {
    this.env = { ...this.env, ...env };
    return this;
  }

  /** What the command reads from standard input. */
  withInput(text: string): this {
    this.input = text;
    return this;
  }

  read(name: string): string {
    return readFileSync(join(this.folder, name), 'utf8');
  }

  async git(...args: string[]): Promise<this> {
    await execa('git', ['-c', 'user.name=Ada Weigher', '-c', 'user.email=ada@example.org', ...args], {
      cwd: this.folder,
    });
    return this;
  }

  async steelyard(...args: string[]): Promise<Outcome> {
    const { stdout, stderr, exitCode } = await this.start(...args);
    return { stdout, stderr, status: exitCode };
  }

  /** The process itself, for tests that send it signals. */
  start(...args: string[]) {
    return execa(process.execPath, [COMMAND, ...args], {
      cwd: this.folder,
      reject: false,
      stripFinalNewline: false,
      extendEnv: false,
      env: { PATH: process.env.PATH ?? '', HOME: this.folder, LANG: 'C.UTF-8', ...this.env },
      maxBuffer: 2 ** 28,
      ...(this.input !== undefined && { input: this.input }),
    });
  }

  async json<T>(...args: string[]): Promise<T> {
    const { stdout, stderr, status } = await this.steelyard(...args);
    if (status !== 0 && status !== 1) throw new Error(`exit status ${status}: ${stderr}`);
    return JSON.parse(stdout) as T;
  }
}

export function dedent(text: string): string {
  const lines = text.replace(/^\n/, '').split('\n');
  const indent = /^ */.exec(lines.find((line) => line.trim() !== '') ?? '')![0].length;
  return lines
    .map((line) => line.slice(Math.min(indent, line.length - line.trimStart().length)))
    .join('\n')
    .replace(/ *$/, '');
}
