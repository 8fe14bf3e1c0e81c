/**
 * What is wrong with this Node, in a sentence with its mend, or null. This file and those that start with it are written in
 * a syntax that a Node far too old reads, since otherwise it would say what it cannot parse instead.
 *
 * @param {string} version  such as 20.20.2
 * @returns {string | null}
 */
export function nodeProblem(version) {
  const [major, minor] = version.split('.').map(Number);
  // From 20.9 on, and tried up to 24.
  if ((major > 20 || (major === 20 && minor >= 9)) && major < 25) return null;
  return (
    `This is Node ${version}, and Holdfast runs on Node 20 (20.9 or later) to 24. ` +
    'Install Node 20, for example with your version manager, then run the same command again.'
  );
}

/** Runs the rest where this Node fits, else says what is wrong. @param {() => Promise<unknown>} rest */
export function onRightNode(rest) {
  const problem = nodeProblem(process.versions.node);
  if (problem === null) return rest();
  process.exitCode = 1;
  process.stderr.write(`\n${problem}\n`);
}
