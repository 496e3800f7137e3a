/**
 * Number and letter drill sizes in ten-thousandths of an inch (ASME B94.11M). Metric and fractional drills are named
 * by their size and need no table.
 */

/** #1 to #80, the largest first. */
const numberSizes = [
  2280, 2210, 2130, 2090, 2055, 2040, 2010, 1990, 1960, 1935, 1910, 1890, 1850, 1820, 1800, 1770, 1730, 1695,
  1660, 1610, 1590, 1570, 1540, 1520, 1495, 1470, 1440, 1405, 1360, 1285, 1200, 1160, 1130, 1110, 1100, 1065,
  1040, 1015, 995, 980, 960, 935, 890, 860, 820, 810, 785, 760, 730, 700, 670, 635, 595, 550, 520, 465, 430,
  420, 410, 400, 390, 380, 370, 360, 350, 330, 320, 310, 292, 280, 260, 250, 240, 225, 210, 200, 180, 160,
  145, 135,
] as const

/** A to Z, the smallest first. */
const letterSizes = [
  2340, 2380, 2420, 2460, 2500, 2570, 2610, 2660, 2720, 2770, 2810, 2900, 2950, 3020, 3160, 3230, 3320, 3390,
  3480, 3580, 3680, 3770, 3860, 3970, 4040, 4130,
] as const

/** One ten-thousandth of an inch in steps of 1e-9 mm, see lengthDecimals. */
const stepsPerTenThousandth = 2_540_000n

/**
 * The size a drill is called by (`#7`, `F`), in steps of 1e-9 mm, or undefined where there is no such drill.
 *
 * Shapes     `name`: `#` with 1 to 80, or one letter, either case.
 * Units      1e-9 mm, exact.
 * Source     ASME B94.11M; every size checked against test/reference/drills/drills.csv.
 *
 * @example
 * drillSizeSteps('#7') // => 5105400000n
 * drillSizeSteps('f') // => 6527800000n
 * drillSizeSteps('#81') // => undefined
 */
export function drillSizeSteps(name: string): bigint | undefined {
  const size = /^#(?:[1-9]|[1-7]\d|80)$/.test(name)
    ? numberSizes[Number(name.slice(1)) - 1]
    : /^[A-Z]$/i.test(name)
      ? letterSizes[name.toUpperCase().charCodeAt(0) - 65]
      : undefined
  return size === undefined ? undefined : BigInt(size) * stepsPerTenThousandth
}
