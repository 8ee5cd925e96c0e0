import { type ReactNode } from 'react';

interface PageHeaderProps {
  readonly title: ReactNode;
  /** One line below: what this is, or its key facts. */
  readonly lead?: ReactNode;
  readonly actions?: ReactNode;
}

export function PageHeader({ title, lead, actions }: PageHeaderProps) {
  return (
    <header className="flex flex-wrap items-end justify-between gap-x-8 gap-y-3 pb-4">
      <div className="min-w-0">
        <h1 className="text-2xl font-semibold tracking-tight text-balance">{title}</h1>
        {lead !== undefined && <div className="mt-1 text-muted">{lead}</div>}
      </div>
      {actions !== undefined && <div className="flex flex-wrap gap-3 print:hidden">{actions}</div>}
    </header>
  );
}
