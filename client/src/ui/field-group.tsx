import { type ReactNode } from 'react';

/** A named part of a form: its name stands in the margin, its fields beside it. */
export function FieldGroup({
  title,
  children,
  lead,
}: {
  readonly title: string;
  readonly lead?: ReactNode;
  readonly children: ReactNode;
}) {
  return (
    <section className="grid gap-x-8 gap-y-4 border-t border-rule py-5 first:border-t-0 first:pt-2 lg:grid-cols-[13rem_1fr]">
      <div>
        <h2 className="font-semibold">{title}</h2>
        {lead !== undefined && <p className="mt-1 text-xs text-muted">{lead}</p>}
      </div>
      <div className="grid gap-x-10 gap-y-5 sm:grid-cols-2 xl:grid-cols-3">{children}</div>
    </section>
  );
}
