const steps = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000, 5000, 10_000, 20_000, 50_000, 100_000];

/** How many things stand between two graduations, and between two long ones, so that there are at most `most` of them. */
export function progressSteps(of: number, most: number): { step: number; long: number } {
  const step = steps.find((candidate) => of / candidate <= most) ?? Math.ceil(of / most);
  return { step, long: step * 5 };
}

/** The graduations of a rule from nothing to all. */
export function progressTicks(of: number, most: number): { at: number; isLong: boolean }[] {
  if (!(of > 0) || !(most > 0)) return [];
  const { step, long } = progressSteps(of, most);
  return Array.from({ length: Math.floor(of / step) + 1 }, (_, index) => ({ at: index * step, isLong: (index * step) % long === 0 }));
}
