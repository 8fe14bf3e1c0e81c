/** One thing that is wrong with a plan, so that its author can find and mend it. */
export interface PlanProblem {
  /** Where in the document: `steps[3].uses[0].part`; empty for the document as a whole. */
  path: string;
  /** What was expected there. */
  expected: string;
  /** What is wrong, in a sentence. */
  message: string;
}

/** `['steps', 3, 'uses']` as `steps[3].uses`. */
export function pathText(path: readonly PropertyKey[]): string {
  return path.reduce<string>((text, key) => {
    if (typeof key === 'number') return `${text}[${key}]`;
    return text ? `${text}.${String(key)}` : String(key);
  }, '');
}
