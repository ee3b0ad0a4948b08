/** Something that works beside the requests. */
export interface Worker {
  start(): void;
  /** Resolves when the piece of work in hand is done. */
  stop(): Promise<void>;
}

/**
 * Runs `round` again and again: at once while there is more to do, after `pauseMs` milliseconds otherwise.
 * A round that fails is told to `onError` and tried again after the pause.
 */
export function repeatedly(options: {
  round: () => Promise<{ more: boolean }>;
  pauseMs: number;
  onError: (error: unknown) => void;
}): Worker {
  let running = false;
  let timer: NodeJS.Timeout | undefined;
  let inHand: Promise<void> = Promise.resolve();

  const run = async (): Promise<void> => {
    let more = false;
    try {
      ({ more } = await options.round());
    } catch (error) {
      options.onError(error);
    }
    if (running) schedule(more ? 0 : options.pauseMs);
  };
  const schedule = (delayMs: number): void => {
    timer = setTimeout(() => {
      inHand = run();
    }, delayMs);
  };

  return {
    start() {
      if (running) return;
      running = true;
      schedule(0);
    },
    async stop() {
      running = false;
      clearTimeout(timer);
      await inHand;
    },
  };
}
