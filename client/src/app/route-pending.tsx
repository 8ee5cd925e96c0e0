import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';

export function RoutePending() {
  return (
    <PageBody>
      <Skeleton lines={6} className="max-w-2xl pt-2" />
    </PageBody>
  );
}
