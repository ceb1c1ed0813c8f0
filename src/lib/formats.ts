import { useMemo } from 'react';
import { formatLength, formatSetting, type LengthStyle } from '#shared/domain/length.ts';
import { formatMass } from '#shared/domain/mass.ts';
import { formatMoney } from '#shared/domain/money.ts';
import type { Shop } from '#shared/schemas/people.ts';
import { useShop } from '#src/lib/session.ts';

const DATE = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });
const TIME = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', hour12: false });
const DAY_MS = 86_400_000;

function startOfDay(date: Date): number {
  return new Date(date.getFullYear(), date.getMonth(), date.getDate()).getTime();
}

/** `today 10:31`, `yesterday 16:02`, `26 days`: how a rack hand says how long a drop has lain. */
export function agoWords(iso: string, now: Date): string {
  const then = new Date(iso);
  const days = Math.round((startOfDay(now) - startOfDay(then)) / DAY_MS);
  if (days <= 0) return `today ${TIME.format(then)}`;
  if (days === 1) return `yesterday ${TIME.format(then)}`;
  return `${days} days`;
}

/** A drop's tag as it is painted on: never fewer than four digits. */
export function formatTag(tag: number): string {
  return `D-${String(tag).padStart(4, '0')}`;
}

/** `1 drop`, `37 drops`. */
export function countOf(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** An unknown heat is said, never left blank. */
export function formatHeat(heat: string | null): string {
  return heat === null ? 'heat unknown' : `heat ${heat}`;
}

export type Formats = ReturnType<typeof formatsOf>;

/** Formatters in the units, fractions and currency of one shop. */
export function formatsOf(shop: Pick<Shop, 'units' | 'inchDenominator' | 'currency'>) {
  const lengthStyle: LengthStyle = { units: shop.units, denominator: shop.inchDenominator };
  return {
    length: (nm: number) => formatLength(nm, lengthStyle),
    setting: (nm: number) => formatSetting(nm, lengthStyle),
    mass: (mg: number) => formatMass(mg, shop.units),
    money: (minor: number) => formatMoney(minor, shop.currency),
    date: (iso: string) => DATE.format(new Date(iso)),
    time: (iso: string) => `${DATE.format(new Date(iso))}, ${TIME.format(new Date(iso))}`,
    ago: (iso: string) => agoWords(iso, new Date()),
    lengthStyle,
    units: shop.units,
    currency: shop.currency,
  };
}

export function useFormats(): Formats {
  const shop = useShop();
  return useMemo(() => formatsOf(shop), [shop]);
}
