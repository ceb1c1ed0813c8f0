import type { ReactNode } from 'react';
import { NavLink } from 'react-router-dom';
import { classNames } from '#src/components/class-names.ts';

type RailItem = { to: string; label: string; icon: ReactNode };

type RailProps = {
  items: readonly RailItem[];
  /** At the foot of the rail, apart from the daily places. */
  foot: readonly RailItem[];
  /** Who is signed in and the way out. */
  person: ReactNode;
};

function RailLink({ to, label, icon }: RailItem) {
  return (
    <NavLink
      to={to}
      className={({ isActive }) =>
        classNames(
          'flex min-h-11 items-center font-head font-medium text-[1.0625rem]',
          'max-md:min-h-14 max-md:min-w-0 max-md:flex-1 max-md:flex-col max-md:justify-center max-md:gap-0.5 max-md:border-t-4 max-md:px-0.5 max-md:text-[0.8125rem]',
          'md:border-l-4 md:px-3.5',
          isActive
            ? 'border-oxide bg-layout-deep text-white'
            : 'border-transparent text-layout-pale hover:text-white',
        )
      }
    >
      <span aria-hidden className="md:hidden">
        {icon}
      </span>
      {label}
    </NavLink>
  );
}

/** The places of the shop: a slim rail at the left, a bar under the thumb on a phone. */
export function Rail({ items, foot, person }: RailProps) {
  return (
    <nav
      aria-label="Places"
      className="on-blue z-30 bg-layout text-chalk max-md:fixed max-md:inset-x-0 max-md:bottom-0 max-md:pb-[env(safe-area-inset-bottom)] print:hidden"
    >
      <div className="flex md:sticky md:top-0 md:h-dvh md:flex-col md:overflow-y-auto md:pt-4.5">
        <p
          aria-hidden
          className="px-4.5 pb-5 font-head text-[1.375rem] leading-none font-semibold tracking-wide max-md:hidden"
        >
          Bar
          <br />
          wright
        </p>
        {items.map((item) => (
          <RailLink key={item.to} {...item} />
        ))}
        <div className="contents md:mt-auto md:block md:pb-2">
          {foot.map((item) => (
            <RailLink key={item.to} {...item} />
          ))}
          <div className="max-md:hidden">{person}</div>
        </div>
      </div>
    </nav>
  );
}
