import { spawn } from 'node:child_process';

export interface NodeRun {
  code: number;
  output: string;
  /** First line that says something, as a person reads it. */
  firstLine: string;
}

/** Runs Node to its end, as a person's shell would. */
export function runNode(
  args: string[],
  env: NodeJS.ProcessEnv = process.env,
  cwd: string = process.cwd(),
): Promise<NodeRun> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, args, { cwd, env, stdio: ['ignore', 'pipe', 'pipe'] });
    let output = '';
    for (const stream of [child.stdout, child.stderr])
      stream.on('data', (chunk: Buffer) => (output += chunk.toString()));
    child.on('error', reject);
    child.on('close', (code) =>
      resolve({ code: code ?? 1, output, firstLine: output.split('\n').find((line) => line.trim() !== '') ?? '' }),
    );
  });
}
