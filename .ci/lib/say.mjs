/** A sentence for the person at the keyboard, who can act on it. `exitCode` 2 means: asked wrongly; 1: it did not work. */
export class Refusal extends Error {
  /**
   * @param {string} sentence
   * @param {1 | 2} [exitCode]
   */
  constructor(sentence, exitCode = 1) {
    super(sentence);
    this.exitCode = exitCode;
  }
}

/** @param {string} sentence */
export function say(sentence) {
  process.stdout.write(`${sentence}\n`);
}

/**
 * Runs a command's work. What it returns is the exit code; a refusal is told in its own sentence, without a stack.
 * @param {() => Promise<number | void>} work
 */
export async function main(work) {
  try {
    process.exitCode = (await work()) ?? 0;
  } catch (error) {
    const told = error instanceof Refusal;
    process.stderr.write(`${told ? error.message : error instanceof Error ? error.stack : String(error)}\n`);
    process.exitCode = told ? error.exitCode : 1;
  }
}

/**
 * The system's word for what went wrong with a file or a port, such as ENOENT.
 * @param {unknown} error
 */
export function codeOf(error) {
  return error instanceof Error && 'code' in error ? String(error.code) : '';
}
