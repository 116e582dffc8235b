/** Ctrl-C or a service manager's stop: closes in good order once, at once when asked twice. */
export function stopOnSignal(stop: () => Promise<void>): void {
  let stopping = false;
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const)
    process.on(signal, () => {
      if (stopping) process.exit(130);
      stopping = true;
      void stop().finally(() => process.exit(0));
    });
}
