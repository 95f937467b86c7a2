/** A plain bag of values and those who listen to its parts. */
export interface Store<State extends object> {
  get(): State;
  /** Sets parts; a part set to the very same value changes nothing. */
  change(parts: Partial<State>): void;
  /** Calls the listener soon after any of the parts changed, once however many changed together. Returns its stop. */
  listen(parts: readonly (keyof State)[], listener: (state: State) => void): () => void;
}

/** A store with its first values. Listeners run in a microtask, in the order they came. */
export function createStore<State extends object>(first: State): Store<State> {
  let state = first;
  const changed = new Set<keyof State>();
  const listeners = new Set<{ parts: readonly (keyof State)[]; listener: (state: State) => void }>();

  function tell(): void {
    const told = new Set(changed);
    changed.clear();
    for (const entry of [...listeners]) {
      if (listeners.has(entry) && entry.parts.some((part) => told.has(part))) entry.listener(state);
    }
  }

  return {
    get: () => state,
    change(parts) {
      const wasQuiet = changed.size === 0;
      for (const part of Object.keys(parts) as (keyof State)[]) {
        if (!Object.is(parts[part], state[part])) changed.add(part);
      }
      if (changed.size === 0) return;
      state = { ...state, ...parts };
      if (wasQuiet) queueMicrotask(tell);
    },
    listen(parts, listener) {
      const entry = { parts, listener };
      listeners.add(entry);
      return () => listeners.delete(entry);
    },
  };
}

/** Acts on a value read from a store whenever it has become another (as JSON). Returns its stop. */
export function follow<State extends object, Value>(
  store: Store<State>,
  parts: readonly (keyof State)[],
  read: (state: State) => Value,
  act: (value: Value) => void,
): () => void {
  let last = JSON.stringify(read(store.get()));
  return store.listen(parts, (state) => {
    const value = read(state);
    const text = JSON.stringify(value);
    if (text === last) return;
    last = text;
    act(value);
  });
}
