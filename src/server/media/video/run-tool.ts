/**
 * Runs ffmpeg or ffprobe on a person's file as if it were hostile: few rights, little memory, low priority, an end by
 * the clock, and never longer than the process that asked (a worker that dies takes its tools with it).
 */
import { spawn } from 'node:child_process';

export interface ToolLimits {
  readonly seconds: number;
  /** The largest file it may write. */
  readonly maxFileBytes: number;
  readonly signal?: AbortSignal;
}

export interface ToolRun extends ToolLimits {
  /** The tool works here; names of files in `args` are relative to it. */
  readonly folder: string;
  /** Told of each line of standard output, as it comes. */
  readonly onLine?: (line: string) => void;
}

export type ToolEnd =
  | { readonly ended: 'well'; readonly output: string }
  | { readonly ended: 'badly'; readonly said: string }
  /** Out of time. */
  | { readonly ended: 'late' };

const MEMORY_BYTES = 3_000_000_000;
const MOST_OUTPUT = 1_000_000;
const MOST_SAID = 2_000;

/** @throws when the tool is missing, or the `signal` aborts (its reason). */
export function runTool(tool: 'ffmpeg' | 'ffprobe', args: readonly string[], run: ToolRun): Promise<ToolEnd> {
  run.signal?.throwIfAborted();
  const limits = [`--as=${MEMORY_BYTES}`, `--fsize=${run.maxFileBytes}`, '--core=0'];
  // Each of these becomes the next by exec, so the one process we hold is the tool itself.
  const child = spawn('setpriv', ['--pdeathsig', 'KILL', '--no-new-privs', 'prlimit', ...limits, 'nice', '-n', '10', tool, ...args], {
    cwd: run.folder,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { PATH: '/usr/bin:/bin', LC_ALL: 'C' },
  });
  let late = false;
  const kill = (): void => { child.kill('SIGKILL'); };
  const clock = setTimeout(() => { late = true; kill(); }, run.seconds * 1_000);
  run.signal?.addEventListener('abort', kill);
  let said = '';
  let output = '';
  let line = '';
  child.stderr.setEncoding('utf8').on('data', (text: string) => { said = (said + text).slice(-MOST_SAID); });
  child.stdout.setEncoding('utf8').on('data', (text: string) => {
    if (run.onLine === undefined) {
      output += text;
      if (output.length > MOST_OUTPUT) kill();
      return;
    }
    const lines = (line + text).split('\n');
    line = (lines.pop() ?? '').slice(-MOST_SAID);
    lines.forEach(run.onLine);
  });
  return new Promise<ToolEnd>((resolve, reject) => {
    child.once('error', reject);
    child.once('close', (code) => {
      if (run.signal?.aborted === true) reject(run.signal.reason instanceof Error ? run.signal.reason : new Error('stopped'));
      else resolve(late ? { ended: 'late' } : code === 0 ? { ended: 'well', output } : { ended: 'badly', said: said.trim() });
    });
  }).finally(() => {
    clearTimeout(clock);
    run.signal?.removeEventListener('abort', kill);
  });
}

/**
 * What every reading of a person's file begins with: only files, and only the two containers we take; so a playlist
 * under a film's name is never followed, to another file or into the net.
 */
export const CAREFULLY = ['-hide_banner', '-v', 'error', '-protocol_whitelist', 'file,pipe', '-format_whitelist', 'mov,matroska'] as const;
