import { Link } from 'react-router-dom';
import type { PlanView } from '#shared/schemas/plans.ts';
import { classNames } from '#src/components/class-names.ts';
import { formatTag, useFormats } from '#src/lib/formats.ts';
import { paths, withSearch } from '#src/lib/paths.ts';

/** Every bar of the plan in order, so that one out of order can be taken or looked up. */
export function BarList({ view, active }: { view: PlanView; active: number | null }) {
  const { length } = useFormats();
  const groups = new Map(view.groups.map((group) => [group.id, group]));
  return (
    <details className="mt-8 border-t-2 border-ink pt-3">
      <summary className="min-h-11 py-2 font-head text-[1.3125rem] font-semibold">
        All {view.bars.length} bars of this plan
      </summary>
      <ol className="m-0 grid list-none gap-2 p-0 sm:grid-cols-2 xl:grid-cols-3">
        {view.bars.map((bar) => {
          const group = groups.get(bar.groupId);
          const stock = group?.stock.find(
            (entry) => entry.stockId === group.result.layouts[bar.layout]?.stockId,
          );
          const words = (
            <>
              <span className="font-mono font-bold">{bar.number}</span>{' '}
              <span className="font-mono">
                {group?.section} ·{' '}
                {stock?.drop ? `drop ${formatTag(stock.drop.tag)}` : stock && length(stock.lengthNm)}
              </span>
              <span className="block text-[0.9375rem] text-muted">
                {bar.state === 'waiting'
                  ? bar.number === active
                    ? 'on the bench now'
                    : 'waiting'
                  : `cut by ${bar.cutBy ?? 'somebody'}${bar.madeDrop ? `, made ${formatTag(bar.madeDrop.tag)} in ${bar.madeDrop.slot}` : ''}`}
              </span>
            </>
          );
          const look = classNames(
            'block min-h-16 border-[1.5px] px-3.5 py-2',
            bar.number === active ? 'border-ink bg-chalk' : 'border-line',
          );
          return (
            <li key={bar.id}>
              {bar.state === 'waiting' ? (
                <Link
                  to={withSearch(paths.benchPlan(view.plan.id), { bar: bar.number })}
                  aria-current={bar.number === active ? 'true' : undefined}
                  className={classNames(look, 'hover:bg-soap')}
                >
                  {words}
                </Link>
              ) : (
                <div className={look}>{words}</div>
              )}
            </li>
          );
        })}
      </ol>
    </details>
  );
}
