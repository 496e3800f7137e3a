/**
 * A number as text with at least `minimum` and at most `maximum` decimals, halves away from zero, as a drawing office
 * rounds. The decimal sign is a point and there is no exponent and no separator of thousands.
 *
 * Rounding works on the shortest decimal that stands for the number, so 1.0005 becomes 1.001, not 1.000.
 *
 * Shapes     `value`: finite, below 1e21 in size; 0 <= minimum <= maximum <= 12.
 * Result     Never `-0`; a negative number carries a hyphen-minus, so that it can be typed back.
 *
 * @example
 * decimalText(3.175, 0, 3) // => '3.175'
 * decimalText(0.09375, 3, 4) // => '0.0938'
 * decimalText(1, 3, 4) // => '1.000'
 */
export function decimalText(value: number, minimum: number, maximum: number): string {
  const [mantissa, exponent = '0'] = Math.abs(value).toExponential().split('e')
  const rounded = Math.round(Number(`${mantissa}e${Number(exponent) + maximum}`))
  const digits = BigInt(rounded)
    .toString()
    .padStart(maximum + 1, '0')
  const whole = digits.slice(0, digits.length - maximum)
  const part = digits
    .slice(digits.length - maximum)
    .replace(/0+$/, '')
    .padEnd(minimum, '0')
  const sign = value < 0 && rounded !== 0 ? '-' : ''
  return `${sign}${whole}${part === '' ? '' : `.${part}`}`
}
