/** A fault that a person can mend: its message is shown as it stands, without a stack. */
export class PlainFault extends Error {}

/**
 * Runs a command's main function. A PlainFault is printed as its sentence; anything else is a mistake of ours and
 * keeps its stack.
 * @param {() => Promise<number | void>} main returns the exit code, 0 when it returns nothing.
 */
export async function runCommand(main) {
  try {
    process.exitCode = (await main()) ?? 0;
  } catch (error) {
    console.error(error instanceof PlainFault ? `\n${error.message}\n` : error);
    process.exitCode = 1;
  }
}
