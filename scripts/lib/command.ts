import { spawn, type ChildProcess, type SpawnOptions } from 'node:child_process';

export interface CommandResult {
  code: number;
  output: string;
}

export interface CommandOptions extends Pick<SpawnOptions, 'cwd' | 'env' | 'uid' | 'gid'> {
  /** Shown while it runs instead of being collected. */
  inherit?: boolean;
  /** Leads a process group of its own, so that what it starts can be ended with it. */
  group?: boolean;
}

const running = new Map<ChildProcess, { group: boolean }>();

/** Ends the commands that have not come to their end, when this process is told to stop. */
export function endRunningCommands(signal: NodeJS.Signals = 'SIGTERM'): void {
  for (const [child, { group }] of running) {
    if (child.pid === undefined) continue;
    try {
      process.kill(group ? -child.pid : child.pid, signal);
    } catch {
      // It ended on its own in the meantime.
    }
  }
}

/** Runs to its end; a command that cannot be started gives code 127 and the reason as its output. */
export function runCommand(
  command: string,
  args: string[],
  options: CommandOptions = {},
): Promise<CommandResult> {
  const { inherit = false, group = false, ...spawnOptions } = options;
  return new Promise((resolve) => {
    const stdio: SpawnOptions['stdio'] = inherit
      ? ['ignore', 'inherit', 'inherit']
      : ['ignore', 'pipe', 'pipe'];
    const child = spawn(command, args, { ...spawnOptions, stdio, detached: group });
    running.set(child, { group });
    let output = '';
    const collect = (chunk: Buffer) => (output += chunk.toString());
    child.stdout?.on('data', collect);
    child.stderr?.on('data', collect);
    const end = (code: number, text?: string) => {
      running.delete(child);
      resolve({ code, output: text ?? output.trim() });
    };
    child.once('error', (error) => end(127, error.message));
    // 'exit', not 'close': a daemon that was started keeps the pipes open.
    child.once('exit', (code) => setTimeout(() => end(code ?? 128), 10));
  });
}
