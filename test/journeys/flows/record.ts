/** The procedure of the invented talk, written out once more without any code of Footing. */
export function lineThroughFirstYear(
  co2Csv: string,
  temperatureCsv: string,
  { start, end }: { start: number; end: number },
): { slope: number; nYears: number } {
  const monthsPpm = new Map<number, number[]>();
  for (const [date = '', ppm] of rowsOf(co2Csv)) {
    const year = Number(date.slice(0, 4));
    monthsPpm.set(year, [...(monthsPpm.get(year) ?? []), Number(ppm)]);
  }
  const warming = new Map(rowsOf(temperatureCsv).map(([year, kelvin]) => [Number(year), Number(kelvin)]));
  const years = [...monthsPpm]
    .filter(([year, months]) => months.length === 12 && warming.has(year) && year >= start && year <= end)
    .map(([year, months]) => ({
      year,
      ppm: months.reduce((sum, ppm) => sum + ppm, 0) / 12,
      kelvin: warming.get(year)!,
    }))
    .sort((one, other) => one.year - other.year);
  const [first] = years;
  if (!first) throw new Error('no year in common');
  const points = years.map(({ ppm, kelvin }) => ({ x: Math.log(ppm / first.ppm), y: kelvin - first.kelvin }));
  const sum = (of: (point: { x: number; y: number }) => number) =>
    points.reduce((total, point) => total + of(point), 0);
  return { slope: sum(({ x, y }) => x * y) / sum(({ x }) => x * x), nYears: years.length };
}

const rowsOf = (csv: string) =>
  csv
    .trim()
    .split(/\r?\n/)
    .slice(1)
    .map((line) => line.split(','));

/** A forcing table of the usual shape with made-up numbers: gases that grow, a haze that grows and clears, a small cycle. */
export function inventedForcingTable(firstYear: number, lastYear: number): string {
  const lines = [
    '# Invented data: no measurement. Effective radiative forcing in W/m2.',
    'year,co2,other_gases,aerosol,total',
  ];
  for (let year = firstYear; year <= lastYear; year += 1) {
    const age = (year - firstYear) / (lastYear - firstYear);
    const co2 = 2.1 * age ** 2;
    const others = 0.9 * age ** 1.5;
    const aerosol = -1.1 * Math.sin(Math.PI * Math.min(age * 1.15, 1)) * age;
    const cycle = 0.05 * Math.sin((2 * Math.PI * (year - firstYear)) / 11);
    const columns = [co2, others, aerosol, co2 + others + aerosol + cycle];
    lines.push([year, ...columns.map((wm2) => wm2.toFixed(4))].join(','));
  }
  return `${lines.join('\n')}\n`;
}
