import { type ReactNode } from 'react';

interface EmptyStateProps {
  /** What there is none of, as a statement. */
  readonly title: string;
  /** What to do next. */
  readonly children?: ReactNode;
  readonly action?: ReactNode;
}

export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="grid max-w-prose gap-2 border-l-2 border-concrete-edge py-2 pl-4">
      <p className="font-semibold">{title}</p>
      {children !== undefined && <div className="text-muted">{children}</div>}
      {action !== undefined && <div className="mt-2 flex flex-wrap gap-3">{action}</div>}
    </div>
  );
}
