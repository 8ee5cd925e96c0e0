interface NotCheckedProps {
  readonly items: readonly string[];
  readonly engineVersion: string;
}

/** What no check here covers, and whose judgement is needed whatever the checks say. */
export function NotChecked({ items, engineVersion }: NotCheckedProps) {
  return (
    <div className="grid gap-2 text-sm">
      <ul className="list-disc pl-5">
        {items.map((item) => (
          <li key={item}>{item}</li>
        ))}
      </ul>
      <p className="text-muted">
        A licensed engineer checks the design under the codes in force locally before it is built. Engine{' '}
        <span className="num">{engineVersion}</span>.
      </p>
    </div>
  );
}
