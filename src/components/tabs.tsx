import { useEffect, useRef } from 'react';
import { NavLink, useLocation } from 'react-router-dom';
import { classNames } from '#src/components/class-names.ts';

type TabsProps = { label: string; tabs: readonly { to: string; label: string; end?: boolean }[] };

/** Neighbouring pages of one place. Each is an address of its own, so these are links. */
export function Tabs({ label, tabs }: TabsProps) {
  const bar = useRef<HTMLElement>(null);
  const { pathname } = useLocation();
  useEffect(() => {
    const active = bar.current?.querySelector<HTMLElement>('[aria-current="page"]');
    if (bar.current && active)
      bar.current.scrollLeft = active.offsetLeft - (bar.current.clientWidth - active.clientWidth) / 2;
  }, [pathname]);
  return (
    <nav
      ref={bar}
      aria-label={label}
      className="relative mb-6 flex gap-x-1 overflow-x-auto border-b-2 border-ink print:hidden"
    >
      {tabs.map((tab) => (
        <NavLink
          key={tab.to}
          to={tab.to}
          end={tab.end ?? true}
          className={({ isActive }) =>
            classNames(
              'flex min-h-11 shrink-0 items-center border-t-4 px-3 sm:px-4 font-head text-[1.0625rem] font-medium',
              isActive ? 'border-oxide bg-ink text-chalk' : 'border-transparent text-ink hover:bg-soap',
            )
          }
        >
          {tab.label}
        </NavLink>
      ))}
    </nav>
  );
}
