const UP = '01234567890123456789';
const DOWN = '98765432109876543210';
/** Columns, rows, diagonals and the cross of a keypad. */
const KEYPAD = ['1470', '2580', '3690', '0741', '0852', '0963', '1590', '3570', '7530', '1478', '3698', '2468', '1357'];
/** Years of birth and of now, as four digits or after a day: 1931 to 2039. */
const YEAR = /^(19[3-9]\d|20[0-3]\d)$/;

/** What is wrong with a PIN, as a sentence; null where nothing is. The first to be tried are refused. */
export function pinFault(pin: string, badgeNumber: string): string | null {
  if (!/^\d{4,6}$/.test(pin)) return 'A PIN has 4 to 6 digits.';
  if (new Set(pin).size < 3) return 'Use three different digits at least.';
  if (UP.includes(pin) || DOWN.includes(pin)) return 'That counts up or down. Choose another.';
  if (pin.length % 2 === 0 && pin.slice(0, pin.length / 2).repeat(2) === pin)
    return 'That repeats itself. Choose another.';
  if (KEYPAD.includes(pin)) return 'That is a line on the keypad. Choose another.';
  if (YEAR.test(pin)) return 'That is a year, among the first to be tried. Choose another.';
  if (badgeNumber.includes(pin) || (badgeNumber.length >= 3 && pin.includes(badgeNumber))) {
    return 'That stands on the badge. Choose another.';
  }
  return null;
}
