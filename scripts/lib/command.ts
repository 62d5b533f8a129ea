import { spawn, type SpawnOptions } from 'node:child_process';

export interface CommandResult {
  code: number;
  output: string;
}

export interface CommandOptions extends Pick<SpawnOptions, 'cwd' | 'env' | 'uid' | 'gid'> {
  /** Shown while it runs instead of being collected. */
  inherit?: boolean;
  /** Heard of the process, so that the caller can end it. */
  onStart?: (pid: number) => void;
}

/** Runs to its end; a command that cannot be started gives code 127 and the reason as its output. */
export function runCommand(
  command: string,
  args: string[],
  options: CommandOptions = {},
): Promise<CommandResult> {
  const { inherit = false, onStart, ...spawnOptions } = options;
  return new Promise((resolve) => {
    const stdio: SpawnOptions['stdio'] = inherit
      ? ['ignore', 'inherit', 'inherit']
      : ['ignore', 'pipe', 'pipe'];
    const child = spawn(command, args, { ...spawnOptions, stdio });
    let output = '';
    const collect = (chunk: Buffer) => (output += chunk.toString());
    child.stdout?.on('data', collect);
    child.stderr?.on('data', collect);
    child.once('error', (error) => resolve({ code: 127, output: error.message }));
    // 'exit', not 'close': a daemon that was started keeps the pipes open.
    child.once('exit', (code, signal) => {
      setImmediate(() => resolve({ code: code ?? (signal === null ? 1 : 128), output: output.trim() }));
    });
    if (child.pid !== undefined) onStart?.(child.pid);
  });
}
