/**
 * Whether a PIN is among those that anybody tries first: at most two different figures, one figure after the other up or down
 * (9 and 0 are neighbours), or the same three figures twice.
 * @param pin six figures.
 */
export function isTrivialPin(pin: string): boolean {
  const figures = [...pin].map(Number)
  const steps = new Set(figures.slice(1).map((figure, index) => (figure - (figures[index] ?? 0) + 10) % 10))
  const isRun = steps.size === 1 && (steps.has(1) || steps.has(9))
  return new Set(figures).size <= 2 || isRun || pin.slice(0, 3) === pin.slice(3)
}
