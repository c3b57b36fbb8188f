import { PeriodicTask } from './periodic-task.js';

const listen = () => {
  const lines: string[] = [];
  return { lines, logger: { log: (line: string) => void lines.push(line), warn: (line: string) => void lines.push(line) } };
};

describe('a task that is done again and again', () => {
  it('is never done twice at once', async () => {
    let running = 0;
    let most = 0;
    let times = 0;
    let finish = () => {};
    const task = new PeriodicTask(
      'work',
      async () => {
        times += 1;
        most = Math.max(most, ++running);
        await new Promise<void>((resolve) => (finish = resolve));
        running -= 1;
      },
      listen().logger,
    );
    const both = Promise.all([task.run(), task.run()]);
    finish();
    await both;
    expect([times, most]).toEqual([1, 1]);
    const third = task.run();
    finish();
    await third;
    expect(times).toBe(2);
  });

  it('tells of a fault once, and of its end', async () => {
    let isDown = true;
    const { lines, logger } = listen();
    const task = new PeriodicTask(
      'work',
      async () => {
        if (isDown) throw Object.assign(new Error('a person’s words'), { code: 'ECONNREFUSED' });
      },
      logger,
    );
    for (let time = 0; time < 3; time++) await task.run();
    isDown = false;
    await task.run();
    await task.run();
    expect(lines).toEqual(['work: Error ECONNREFUSED; it is tried again', 'work: works again']);
  });
});
