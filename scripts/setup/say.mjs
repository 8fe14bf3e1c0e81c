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
      if (error instanceof Mendable) return process.stderr.write(`\n${error.message}\n`);
      if (error?.code === 'ENOSPC') {
        return process.stderr.write(
          '\nThe disk is full. Free some space (df -h shows where), then run the same command again.\n',
        );
      }
      process.stderr.write(
        `\nSomething that Holdfast did not expect went wrong: ${error?.message ?? error}\n\n${error?.stack ?? ''}\n`,
      );
    },
  );
}
