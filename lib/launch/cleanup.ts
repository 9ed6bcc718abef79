/**
 * What has been started and must be stopped, latest first. One that cannot be stopped is named and does not keep
 * the others running. What is added after the stop began is stopped at once.
 */
export function createCleanup(report: (line: string) => void = console.error) {
  const started: { name: string; stop: () => unknown }[] = [];
  let running: Promise<void> | undefined;

  async function stopOne({ name, stop }: { name: string; stop: () => unknown }): Promise<void> {
    try {
      await stop();
    } catch (error) {
      report(`  ${name} could not be stopped: ${(error as Error).message}`);
    }
  }

  async function stopAll(): Promise<void> {
    for (let last = started.pop(); last; last = started.pop()) await stopOne(last);
  }

  return {
    add(name: string, stop: () => unknown): void {
      if (running) void (running = running.then(() => stopOne({ name, stop })));
      else started.push({ name, stop });
    },
    async run(): Promise<void> {
      running ??= stopAll();
      await running;
    },
  };
}
