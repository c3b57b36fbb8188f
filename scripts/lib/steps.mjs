let stopping = false;

/** From now on a step that does not come to its end was stopped, not failed. */
export function stepsAreStopping() {
  stopping = true;
}

/** Runs `work` and prints one line for it: the title, what came of it, the time it took. */
export async function step(title, work) {
  const started = performance.now();
  process.stdout.write(`${title} … `);
  try {
    const outcome = await work();
    process.stdout.write(`${typeof outcome === 'string' ? `${outcome}, ` : ''}${seconds(started)}\n`);
    return outcome;
  } catch (error) {
    process.stdout.write(`${stopping ? 'stopped' : 'failed'} after ${seconds(started)}\n`);
    throw error;
  }
}

export function seconds(started) {
  return `${((performance.now() - started) / 1000).toFixed(1)} s`;
}

/** A Problem as its message and output; anything unforeseen with its stack. */
export function printError(error) {
  if (error.output) process.stderr.write(`\n${error.output.trimEnd()}\n`);
  process.stderr.write(`\n${error.name === 'Problem' ? error.message : (error.stack ?? error)}\n`);
}
