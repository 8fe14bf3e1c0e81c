/** A failure that a person can mend: one sentence on what happened, one on what to do. */
export class Mendable extends Error {
  /**
   * @param {string} what  what happened, in a sentence
   * @param {string} mend  what to do about it
   */
  constructor(what, mend) {
    super(`${what} ${mend}`);
    this.name = 'Mendable';
  }
}

/** Told by what a program said before it failed. @param {string} output */
export function throwWhenDiskFull(output) {
  if (/ENOSPC|No space left/i.test(output)) throw Object.assign(new Error('no space left'), { code: 'ENOSPC' });
}

/** @param {string} line */
export function say(line) {
  process.stdout.write(`${line}\n`);
}

/**
 * Runs a command-line program: a failure that can be mended is said in words, any other with its trace after the words.
 *
 * @param {() => Promise<number | void>} main  resolves to the exit code
 */
export function runMain(main) {
  main().then(
    (code) => {
      process.exitCode = code ?? 0;
    },
    (error) => {
      process.exitCode = 1;
      const words = error instanceof Mendable ? error.message : wordsOf(error);
      if (words !== null) return process.stderr.write(`\n${words}\n`);
      process.stderr.write(
        `\nSomething that Holdfast did not expect went wrong: ${error?.message ?? error}\n\n${error?.stack ?? ''}\n`,
      );
    },
  );
}

/** What the system refused, and the mend; null for what nobody thought of. @param {NodeJS.ErrnoException | null} error */
function wordsOf(error) {
  switch (error?.code) {
    case 'ENOSPC':
      return 'The disk is full. Free some space (df -h shows where), then run the same command again.';
    case 'EACCES':
    case 'EPERM':
    case 'EROFS':
      if (!error.path) return null;
      return (
        `This account may not read or write ${error.path}. Give it the project's folder (sudo chown -R "$(id -un)" .), or move ` +
        'the project to a folder of its own, then run the same command again.'
      );
    case 'ENOENT':
      if (!error.syscall?.startsWith('spawn')) return null;
      return `The program "${error.path}" is missing. Install it, then run the same command again.`;
    default:
      return null;
  }
}
