import { lazy, Suspense } from 'react';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import type { CurveComparisonProps } from './curve-comparison.tsx';

const CurveComparison = lazy(() => import('./curve-comparison.tsx'));

export function LazyCurveComparison(props: CurveComparisonProps) {
  return (
    <Suspense fallback={<Skeleton lines={6} />}>
      <CurveComparison {...props} />
    </Suspense>
  );
}
