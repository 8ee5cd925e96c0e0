import { type ReactNode } from 'react';
import { classNames } from '#client/src/lib/class-names.ts';

interface KeyValueProps {
  readonly items: readonly {
    readonly label: ReactNode;
    readonly value: ReactNode;
    readonly isNumber?: boolean;
  }[];
  readonly className?: string;
}

/** Names on the left, values on the right, one hairline each. */
export function KeyValue({ items, className }: KeyValueProps) {
  return (
    <dl className={classNames('grid', className)}>
      {items.map((item, i) => (
        <div key={i} className="flex items-baseline justify-between gap-4 border-t border-rule py-1.5">
          <dt className="text-muted">{item.label}</dt>
          <dd className={classNames('min-w-0 text-right', item.isNumber !== false && 'num')}>{item.value}</dd>
        </div>
      ))}
    </dl>
  );
}
