/** Short films for tests, made on the spot. */
import { execFileSync } from 'node:child_process';
import { join } from 'node:path';

/** Runs ffmpeg in `folder`. */
export function ffmpeg(folder: string, ...args: string[]): void {
  execFileSync('ffmpeg', ['-v', 'error', '-y', '-nostdin', ...args], { cwd: folder, stdio: ['ignore', 'ignore', 'pipe'] });
}

export interface Clip {
  readonly seconds?: number;
  readonly size?: string;
  readonly rate?: number;
  /** Codec arguments in place of H.264. */
  readonly codec?: readonly string[];
  readonly more?: readonly string[];
  readonly sound?: boolean;
}

/** A moving test picture with a tone. @returns its path. */
export function makeClip(folder: string, name: string, { seconds = 2, size = '320x180', rate = 10, codec = ['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv420p'], more = [], sound = true }: Clip = {}): string {
  ffmpeg(folder, '-f', 'lavfi', '-i', `testsrc=s=${size}:d=${seconds}:r=${rate}`, ...(sound ? ['-f', 'lavfi', '-i', `sine=d=${seconds}`, '-shortest'] : []), ...codec, ...more, name);
  return join(folder, name);
}
