const LONGEST_PAUSE = 30_000;
const STEADY_AFTER = 60_000;

/**
 * Keeps services going: one that ends by itself is started again after 1, 2, 4 … 30 s, and says so.
 * The pauses begin anew once it has run for a minute.
 */
export function createSupervisor({ say, onChange = () => {}, firstPauseMs = 1000 }) {
  const services = [];
  let stopped = false;

  function watch(service) {
    let failures = 0;
    let startedAt = Date.now();
    let timer = null;
    service.cancelRestart = () => clearTimeout(timer);

    const again = (what) => {
      if (stopped) return;
      if (Date.now() - startedAt > STEADY_AFTER) failures = 0;
      const pauseMs = Math.min(firstPauseMs * 2 ** failures, LONGEST_PAUSE);
      failures += 1;
      say(`${service.title} ${what}; it is started again in ${pauseMs / 1000} s. Its log: ${service.logFile}`);
      clearTimeout(timer);
      timer = setTimeout(restart, pauseMs);
    };
    let starting = false;
    const restart = async () => {
      if (stopped) return;
      starting = true;
      startedAt = Date.now();
      try {
        await service.start();
        starting = false;
        if (stopped) return;
        if (service.pid === null) return again('ended again');
        say(`${service.title} is running again.`);
        onChange();
      } catch {
        starting = false;
        again('did not come back');
      }
    };
    service.onUnexpectedExit(({ code, signal }) => {
      // While it starts, `start` itself reports the end.
      if (!starting) again(`ended unexpectedly (${signal ?? `code ${code}`})`);
    });
  }

  return {
    /** From now on `stop` ends this service too. */
    add(service) {
      services.push(service);
    },
    /** From now on this service, which is running, is started again when it ends. */
    watch,
    /** Stops all, the last one first, and waits for each. */
    async stop() {
      stopped = true;
      for (const service of services) service.cancelRestart?.();
      for (const service of [...services].reverse()) await service.stop();
    },
  };
}
