/** Places in memory for objects on their way: whoever finds none waits for one, first come first served. */

export interface Places {
  /** Resolves once the holder has a place. */
  take(holder: number): Promise<void>;
  /** Gives up the holder's place, or its turn. */
  leave(holder: number): void;
}

export function openPlaces(count: number): Places {
  const holders = new Set<number>();
  const waiting = new Map<number, () => void>();

  const admitNext = (): void => {
    const [next] = waiting;
    if (next === undefined || holders.size >= count) return;
    const [holder, enter] = next;
    waiting.delete(holder);
    holders.add(holder);
    enter();
  };

  return {
    take: (holder) =>
      new Promise((enter) => {
        waiting.set(holder, enter);
        admitNext();
      }),
    leave(holder) {
      waiting.delete(holder);
      holders.delete(holder);
      admitNext();
    },
  };
}
