/** Steps that build on each other: when one fails, those after it fail at once and say why. */
export function story(onFailure: (step: string) => Promise<void>) {
  let failed: string | null = null;
  return (name: string, run: () => Promise<void>): void =>
    it(name, async () => {
      // without a trace: there is nothing to find here
      if (failed) throw Object.assign(new Error(), { stack: `Not tried, since this step failed before: ${failed}` });
      try {
        await run();
      } catch (error) {
        failed = name;
        await onFailure(name);
        throw error;
      }
    });
}
