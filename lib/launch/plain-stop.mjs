/** A reason to stop that a person can act on; shown as one sentence, without a stack. */
export class PlainStop extends Error {}

/** Runs a launcher's main function and ends the process with its outcome. */
export async function runMain(main) {
  try {
    process.exitCode = (await main()) ?? 0;
  } catch (error) {
    console.error(error instanceof PlainStop ? `\nNeap: ${error.message}` : error);
    process.exitCode = 1;
  }
}
