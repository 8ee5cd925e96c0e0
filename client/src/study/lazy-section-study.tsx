import { lazy, Suspense } from 'react';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import type { SectionStudyProps } from './section-study.tsx';

const SectionStudy = lazy(() => import('./section-study.tsx'));

/** The study of a section, fetched when it is first shown: curve and scatter are no part of the first page. */
export function LazySectionStudy(props: SectionStudyProps) {
  return (
    <Suspense fallback={<Skeleton lines={5} />}>
      <SectionStudy {...props} />
    </Suspense>
  );
}
