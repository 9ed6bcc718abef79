/** Numbers that look random and are the same at every run: mulberry32, and Box and Muller's normal deviates. */
export function dice(seed: number) {
  let state = seed >>> 0;
  const uniform = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
  const normal = (mean: number, spread: number) =>
    mean + spread * Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
  return { uniform, normal };
}

/** Monday to Sunday, as logarithms. */
const WEEK = [0, -0.1, -0.1, -0.05, 0.1, 0.7, 0.6];

/**
 * Two years of a dock's daily hires as they might be: a season, weekends, growth that is not steady, weather that
 * changes by the day and spells of it that last for weeks. What the forecast takes for usual was settled on these.
 */
export function simulateHires(seed: number, days = 731): number[] {
  const { uniform, normal } = dice(seed);
  const season = {
    height: 0.5 + 0.8 * uniform(),
    shift: normal(0, 0.15),
    second: normal(0, 0.15),
    third: normal(0, 0.15),
  };
  const [growth, weekend] = [normal(0.2, 0.25), 0.3 + uniform()];
  let [spell, weather, drift] = [0, 0, 0];
  return Array.from({ length: days }, (_, day) => {
    const angle = (2 * Math.PI * day) / 365.25;
    spell = 0.97 * spell + normal(0, 0.15 * Math.sqrt(1 - 0.97 ** 2));
    weather = 0.4 * weather + normal(0, 0.35 * Math.sqrt(1 - 0.4 ** 2));
    drift += normal(0, 0.015);
    const level =
      season.height * Math.cos(angle - (2 * Math.PI * 200) / 365.25 + season.shift) +
      season.second * Math.cos(2 * angle) +
      season.third * Math.sin(2 * angle) +
      (growth * day) / 365.25;
    return Math.round(600 * Math.exp(level + drift + spell + weather + weekend * WEEK[(day + 5) % 7]!));
  });
}
