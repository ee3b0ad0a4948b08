/**
 * The children of one start, in the order they were started in.
 * @param {(child: { name: string; pid: number }) => void} onChild
 */
export function createCrew(onChild) {
  const children = [];
  let stopping = false;
  let reportBroken;
  const broken = new Promise((resolve) => {
    reportBroken = resolve;
  });
  return {
    /** Resolves with a sentence when one of them ends by itself. */
    broken,
    add(child) {
      children.push(child);
      onChild(child);
      void child.exited.then((how) => {
        if (!stopping) reportBroken(`${child.name} ended by itself (${how}); its log is ${child.logFile}.`);
      });
    },
    /** Ends them from the last to the first, so that none loses what it leans on. */
    async stop() {
      stopping = true;
      for (const child of [...children].reverse()) await child.stop();
    },
  };
}
