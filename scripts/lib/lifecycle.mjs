import { stopCommands } from './processes.mjs';
import { stepsAreStopping } from './steps.mjs';

/** Thrown into whatever is under way once the program was asked to stop. */
export class Stopped extends Error {}

/**
 * Ends everything in order, once: commands under way first, then what was registered, last one first.
 * `handleSignals` makes Ctrl-C, SIGTERM and a closed terminal do that and then exit with `code`.
 */
export function createLifecycle() {
  const stops = [];
  let stopping = null;
  let interrupted = false;

  function stop() {
    stopping ??= (async () => {
      await stopCommands();
      for (const end of stops.reverse()) {
        try {
          await end();
        } catch (error) {
          process.stderr.write(`While stopping: ${error.message}\n`);
        }
      }
    })();
    return stopping;
  }

  return {
    stop,
    get isStopping() {
      return stopping !== null;
    },
    get wasInterrupted() {
      return interrupted;
    },
    /** Registers `end`; called at once when all is being stopped already. */
    async onStop(end) {
      if (stopping) await end();
      else stops.push(end);
    },
    check() {
      if (stopping) throw new Stopped('stopping');
    },
    handleSignals(code, announce = () => {}) {
      const end = async (signal) => {
        // npm passes on a Ctrl-C that the terminal has already sent: the second one changes nothing.
        if (interrupted) return;
        interrupted = true;
        stepsAreStopping();
        announce(signal);
        await stop();
        process.exit(code);
      };
      for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, end);
      endWithNpm(() => end('npm ended'));
    },
  };
}

/** npm that is killed outright can't pass a signal on: stop when it is gone. */
function endWithNpm(end) {
  if (!process.env.npm_lifecycle_event) return;
  const parent = process.ppid;
  setInterval(() => {
    if (process.ppid !== parent) end();
  }, 1000).unref();
}
