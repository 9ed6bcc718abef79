export type KeypadKey = '0' | '1' | '2' | '3' | '4' | '5' | '6' | '7' | '8' | '9' | '.' | 'back';

/**
 * What a number field shows after a key is pressed on `value`: at most `wholeDigits` before the decimal
 * mark and `decimals` after it, one mark, no leading zeros. A key that does not fit changes nothing.
 */
export function pressKey(value: string, key: KeypadKey, decimals: number, wholeDigits: number): string {
  if (key === 'back') return value.slice(0, -1);
  if (key === '.') {
    if (decimals === 0 || value.includes('.')) return value;
    return value === '' ? '0.' : `${value}.`;
  }
  const [whole = '', fraction] = value.split('.');
  if (fraction !== undefined) return fraction.length < decimals ? value + key : value;
  if (value === '0') return key;
  return whole.length < wholeDigits ? value + key : value;
}

/** Keeps of typed or pasted text what `pressKey` would have let through; a comma counts as the mark. */
export function cleanTyped(text: string, decimals: number, wholeDigits: number): string {
  let value = '';
  for (const sign of text.replaceAll(',', '.')) {
    if (/[0-9.]/.test(sign)) value = pressKey(value, sign as KeypadKey, decimals, wholeDigits);
  }
  return value;
}
