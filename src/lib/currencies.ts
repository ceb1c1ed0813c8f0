const NAMES = new Intl.DisplayNames(['en'], { type: 'currency' });

/** Every ISO 4217 code the browser knows, by code, with its name. */
export function currencyChoices(): { value: string; label: string }[] {
  return Intl.supportedValuesOf('currency').map((code) => ({
    value: code,
    label: `${code} · ${NAMES.of(code) ?? code}`,
  }));
}

/** Digits of the minor unit by ISO 4217: 2 for USD, 0 for JPY, 3 for KWD. */
export function currencyDigits(currency: string): number {
  return (
    new Intl.NumberFormat('en', { style: 'currency', currency }).resolvedOptions().maximumFractionDigits ?? 2
  );
}
