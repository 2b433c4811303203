/** A stream of invented chance that is the same for the same names, on every machine. */
export interface Random {
  /** From 0 up to, not including, 1. */
  next(): number;
  between(low: number, high: number): number;
  /** A whole number from low to high, both included. */
  whole(low: number, high: number): number;
  chance(probability: number): boolean;
  pick<T>(choices: readonly T[]): T;
  pickWeighted<T>(choices: readonly { readonly weight: number; readonly choice: T }[]): T;
  /** Close to the normal distribution with mean 0 and deviation 1; never beyond 3.5. */
  normal(): number;
}

/** FNV-1a, 32 bits (G. Fowler, L. C. Noll, K.-P. Vo; from memory): the names in, a start for the stream out. */
function hash(text: string): number {
  let state = 0x811c9dc5;
  for (let at = 0; at < text.length; at += 1) {
    state = Math.imul(state ^ text.charCodeAt(at), 0x01000193);
  }
  return state >>> 0;
}

/** The stream named by its parts: randomFrom('demo', 'W4071', 'p1') never meets randomFrom('demo', 'W4071', 'p2'). */
export function randomFrom(...names: readonly (string | number)[]): Random {
  let state = hash(names.join('\u0000'));
  // Mulberry32 (T. Ettinger, public domain; from memory): enough for drawing, of no use for secrets.
  const next = (): number => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
  const between = (low: number, high: number): number => low + (high - low) * next();
  const whole = (low: number, high: number): number => low + Math.floor(next() * (high - low + 1));
  return {
    next,
    between,
    whole,
    chance: (probability) => next() < probability,
    pick: (choices) => {
      const choice = choices[whole(0, choices.length - 1)];
      if (choice === undefined) throw new RangeError('There is nothing to pick from.');
      return choice;
    },
    pickWeighted: (choices) => {
      let left = next() * choices.reduce((sum, each) => sum + each.weight, 0);
      for (const each of choices) {
        left -= each.weight;
        if (left < 0) return each.choice;
      }
      const last = choices.at(-1);
      if (!last) throw new RangeError('There is nothing to pick from.');
      return last.choice;
    },
    normal: () => {
      // The sum of twelve uniform numbers less six: mean 0, variance 1.
      let sum = -6;
      for (let draw = 0; draw < 12; draw += 1) sum += next();
      return Math.max(-3.5, Math.min(3.5, sum));
    },
  };
}
