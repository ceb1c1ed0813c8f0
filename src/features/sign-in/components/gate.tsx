import type { ReactNode } from 'react';
import { BarDrawing } from '#src/features/sign-in/components/bar-drawing.tsx';

/** The frame of the pages before sign-in: the work at the left, what the product is about at the right. */
export function Gate({ title, sub, children }: { title: string; sub?: ReactNode; children: ReactNode }) {
  return (
    <div className="grid min-h-dvh lg:grid-cols-[minmax(26rem,34rem)_1fr]">
      <title>{`${title} · Barwright`}</title>
      <main className="min-w-0 px-5 py-8 sm:px-10 lg:py-14">
        <p className="font-head text-[1.375rem] font-semibold tracking-wide text-layout">Barwright</p>
        <h1 className="mt-7">{title}</h1>
        {sub && <p className="mt-1 text-muted">{sub}</p>}
        <div className="mt-6">{children}</div>
      </main>
      <aside className="flex flex-col justify-center overflow-hidden bg-layout py-10 text-chalk max-lg:hidden">
        <BarDrawing />
        <p className="px-12 pt-10 font-head text-[2.5rem] leading-tight font-semibold xl:px-20">
          From part list to last drop.
        </p>
        <p className="max-w-xl px-12 pt-3 text-lg text-layout-pale xl:px-20">
          The cheapest set of bars and drops that makes every piece, the sheet to cut each bar by, and a rack
          that stays true because the cutting keeps it so.
        </p>
      </aside>
    </div>
  );
}
