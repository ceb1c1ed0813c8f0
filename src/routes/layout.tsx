import { Suspense } from 'react';
import { ClipboardList, Layers, Ruler, Scissors, Settings2, Tag } from 'lucide-react';
import { Navigate, Outlet, ScrollRestoration, useLocation, useNavigation } from 'react-router-dom';
import { Busy } from '#src/components/busy.tsx';
import { Rail } from '#src/components/rail.tsx';
import { SignedInPerson } from '#src/features/sign-in/components/signed-in-person.tsx';
import { useSession } from '#src/lib/session.ts';
import { paths } from '#src/lib/paths.ts';

const ICON = { size: 21, strokeWidth: 1.75 };
const PLACES = [
  { to: paths.jobs(), label: 'Jobs', icon: <ClipboardList {...ICON} /> },
  { to: paths.plans(), label: 'Plans', icon: <Ruler {...ICON} /> },
  { to: paths.buying(), label: 'Buying', icon: <Layers {...ICON} /> },
  { to: paths.bench(), label: 'Bench', icon: <Scissors {...ICON} /> },
  { to: paths.rack(), label: 'Rack', icon: <Tag {...ICON} /> },
];
const FOOT = [{ to: paths.shop(), label: 'Shop', icon: <Settings2 {...ICON} /> }];

/** Before the first answer: the rail's place is kept so that nothing jumps. */
export function Starting() {
  return (
    <div className="min-h-dvh md:grid md:grid-cols-[92px_1fr]">
      <div className="bg-layout max-md:hidden" />
      <Busy label="Opening the shop" className="p-9" />
    </div>
  );
}

export function Component() {
  const { person, shop } = useSession();
  const location = useLocation();
  const navigation = useNavigation();
  if (!person || !shop) return <Navigate to={paths.signIn(location.pathname + location.search)} replace />;
  return (
    <div className="min-h-dvh md:grid md:grid-cols-[92px_minmax(0,1fr)]">
      <a
        href="#main"
        className="absolute left-2 z-50 -translate-y-full bg-chalk px-4 py-3 font-head text-lg font-semibold text-layout focus:translate-y-2"
      >
        Skip to the page
      </a>
      <header className="on-blue flex items-center justify-between bg-layout pl-4 text-chalk md:hidden print:hidden">
        <p className="font-head text-[1.1875rem] font-semibold">Barwright</p>
        <SignedInPerson person={person} narrow />
      </header>
      <Rail items={PLACES} foot={FOOT} person={<SignedInPerson person={person} />} />
      <main
        id="main"
        tabIndex={-1}
        className="min-w-0 outline-none max-md:pb-20"
        aria-busy={navigation.state === 'loading' || undefined}
      >
        <Suspense fallback={<Busy label="Loading" className="p-9" />}>
          <Outlet />
        </Suspense>
      </main>
      <ScrollRestoration />
    </div>
  );
}
