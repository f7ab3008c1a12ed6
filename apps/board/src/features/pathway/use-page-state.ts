/** What the address of the page holds: the milestone that is open, how to look, how close. */
import { useSyncExternalStore } from 'react';
import { useSearchParams } from 'react-router-dom';
import { periods, type Period } from '../../ruler/scale.ts';

const subscribeTo = (query: string) => (listener: () => void) => {
  const list = window.matchMedia(query);
  list.addEventListener('change', listener);
  return () => list.removeEventListener('change', listener);
};
const narrow = '(max-width: 899px)';
const subscribeNarrow = subscribeTo(narrow);
const subscribePrint = subscribeTo('print');

export const useIsNarrow = (): boolean =>
  useSyncExternalStore(subscribeNarrow, () => window.matchMedia(narrow).matches);
export const useIsPrinting = (): boolean =>
  useSyncExternalStore(subscribePrint, () => window.matchMedia('print').matches);

export const pageViews = ['ruler', 'list'] as const;
export type PageView = (typeof pageViews)[number];

export const usePageState = () => {
  const [params, setParams] = useSearchParams();
  const isNarrow = useIsNarrow();
  const set = (name: string, value: string | null) =>
    setParams(
      (was) => {
        const next = new URLSearchParams(was);
        if (value === null) next.delete(name);
        else next.set(name, value);
        return next;
      },
      { replace: name !== 'm', preventScrollReset: true },
    );
  const view: PageView = pageViews.find((one) => one === params.get('view')) ?? (isNarrow ? 'list' : 'ruler');
  const period: Period = periods.find((one) => one === params.get('look')) ?? 'all';
  return {
    milestone: params.get('m'),
    view,
    period,
    open: (key: string | null) => set('m', key),
    setView: (next: PageView) => set('view', next),
    setPeriod: (next: Period) => set('look', next === 'all' ? null : next),
    hrefOf: (key: string): string => {
      const next = new URLSearchParams(params);
      next.set('m', key);
      return `?${next.toString()}`;
    },
  };
};

export type PageState = ReturnType<typeof usePageState>;
